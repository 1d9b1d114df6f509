import type { RunSummary } from '@quarterpoise/dto';
import { useTranslation } from 'react-i18next';
import { Link } from 'react-router-dom';
import { Amount } from '../../../components/amount';
import { Moment } from '../../../components/civil-date';
import { formatCount } from '../../../lib/format';

/** The newest complete run in two sentences. */
export function RunOutcome({ run, path }: { run: RunSummary; path: string }) {
  const { t, i18n } = useTranslation('run');
  const number = (value: number) => formatCount(value, i18n.language);
  return (
    <div>
      <p>
        {t('outcome.accounts', { count: run.accountCount, number: number(run.accountCount) })}
        {run.totals && (
          <>
            {' '}
            {t('outcome.gain')} <Amount cents={run.totals.gainCents} signed />
            {run.totals.notComputed > 0 &&
              `; ${t('outcome.notComputed', { count: run.totals.notComputed, number: number(run.totals.notComputed) })}`}
            .
          </>
        )}
      </p>
      <p className="quiet">
        {t('outcome.startedBy', { name: run.startedByName, via: t(`via.${run.startedVia}`) })}{' '}
        <Moment at={run.startedAt} />. <Link to={path}>{t('outcome.see')}</Link>
      </p>
    </div>
  );
}
