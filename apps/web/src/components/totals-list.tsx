import type { RunTotals } from '@quarterpoise/dto';
import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { formatCount } from '../lib/format';
import { Amount } from './amount';
import styles from './run-totals.module.css';

/** How the plan's opening became its closing, and how many accounts came out how. */
export function TotalsList({ totals }: { totals: RunTotals }) {
  const { t, i18n } = useTranslation('figures');
  const count = (value: number) => <span className="figures">{formatCount(value, i18n.language)}</span>;
  return (
    <dl className={styles.totals}>
      <dt>{t('totals.opening')}</dt>
      <dd>
        <Amount cents={totals.openingCents} />
      </dd>
      <dt>{t('totals.netFlow')}</dt>
      <dd>
        <Amount cents={totals.netFlowCents} />
      </dd>
      <dt>{t('totals.gain')}</dt>
      <dd>
        <Amount cents={totals.gainCents} signed />
      </dd>
      <dt className={styles.closing}>{t('totals.closing')}</dt>
      <dd className={styles.closing}>
        <Amount cents={totals.closingCents} />
      </dd>
      <dt>{t('totals.solved')}</dt>
      <dd>{count(totals.solved)}</dd>
      {Object.entries(totals.byStatus)
        .filter(([status, number]) => status !== 'solved' && number > 0)
        .map(([status, number]) => (
          <StatusLine key={status} name={t(`status.${status}`)} count={count(number)} />
        ))}
    </dl>
  );
}

function StatusLine({ name, count }: { name: string; count: ReactNode }) {
  return (
    <>
      <dt>{name}</dt>
      <dd>{count}</dd>
    </>
  );
}
