import type { SignOffSheet as Sheet } from '@quarterpoise/dto';
import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Moment } from '../../../components/civil-date';
import { DistributionChart } from '../../../components/distribution-chart';
import { Note } from '../../../components/note';
import { TiesTable } from '../../../components/ties-table';
import { TotalsList } from '../../../components/totals-list';
import { formatCount, formatQuarter } from '../../../lib/format';
import { SignForm } from './sign-form';
import styles from './sign-off.module.css';
import { StatementWording } from './statement-wording';

interface SignOffSheetProps {
  sheet: Sheet;
  quarterId: string;
  canSign: boolean;
  /** Who signed, when it is signed already. */
  signed: ReactNode;
  /** The drawn accounts as a table; the route brings it from the results. */
  sample: ReactNode;
}

/** What the second person looks at, top to bottom, with the signature at the end. */
export function SignOffSheet({ sheet, quarterId, canSign, signed, sample }: SignOffSheetProps) {
  const { t, i18n } = useTranslation('sign-off');
  const { run } = sheet;
  const number = (value: number) => formatCount(value, i18n.language);
  const isTied = run.totals?.ties.every((tie) => !tie.checked || tie.tied) ?? false;
  return (
    <div className={styles.sheet}>
      <p className="quiet">
        {t('runBy', { name: run.startedByName })} <Moment at={run.startedAt} />.{' '}
        {t('ledger', { version: run.ledgerVersion })}
      </p>
      {run.totals && (
        <>
          <section>
            <h2>{t('ties')}</h2>
            {!isTied && <Note tone="attention">{t('tiesDiffer')}</Note>}
            <TiesTable ties={run.totals.ties} />
          </section>
          <div className={styles.pair}>
            <section>
              <h2>{t('totals')}</h2>
              <TotalsList totals={run.totals} />
            </section>
            <section>
              <h2>{t('distribution')}</h2>
              <DistributionChart
                now={run.totals.distribution}
                nowName={formatQuarter(sheet.quarter.code, i18n.language)}
                before={sheet.lastQuarter?.distribution ?? null}
                beforeName={sheet.lastQuarter ? formatQuarter(sheet.lastQuarter.code, i18n.language) : null}
              />
              {!sheet.lastQuarter && <p className="quiet">{t('noLastQuarter')}</p>}
            </section>
          </div>
        </>
      )}
      <section>
        <h2>{t('flags')}</h2>
        <p>
          {sheet.undecidedFlagCount === 0
            ? t('allDecided')
            : t('undecided', { count: sheet.undecidedFlagCount, number: number(sheet.undecidedFlagCount) })}{' '}
          {sheet.heldCount === 0
            ? t('noneHeld')
            : t('held', { count: sheet.heldCount, number: number(sheet.heldCount) })}
        </p>
      </section>
      <section>
        <h2>{t('wording.title')}</h2>
        <StatementWording sample={sheet.sample} quarter={sheet.quarter} />
      </section>
      <section>
        <h2>{t('sample', { count: sheet.sample.length })}</h2>
        <p className="quiet">{t('sampleText')}</p>
        {sample}
      </section>
      <section className={styles.signature} aria-labelledby="signature">
        <h2 id="signature">{t('signature')}</h2>
        {signed ?? <SignForm sheet={sheet} quarterId={quarterId} canSign={canSign} />}
      </section>
    </div>
  );
}
