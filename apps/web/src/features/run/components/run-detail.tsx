import type { RunSummary, RunTotals } from '@quarterpoise/dto';
import { useTranslation } from 'react-i18next';
import { Moment } from '../../../components/civil-date';
import { DistributionChart } from '../../../components/distribution-chart';
import { EmptyState } from '../../../components/empty-state';
import { Note } from '../../../components/note';
import { TiesTable } from '../../../components/ties-table';
import { TotalsList } from '../../../components/totals-list';
import { RunProgress } from './run-progress';
import styles from './run.module.css';

interface RunDetailProps {
  run: RunSummary;
  quarterName: string;
  lastQuarter: { name: string; distribution: RunTotals['distribution'] } | null;
  canCancel: boolean;
}

/** One run: how far it is or how it came out, and the frozen inputs that it rests on. */
export function RunDetail({ run, quarterName, lastQuarter, canCancel }: RunDetailProps) {
  const { t } = useTranslation('run');
  const isGoing = run.state === 'queued' || run.state === 'computing';
  return (
    <div className={styles.detail}>
      {run.isRehearsal && <Note>{t('rehearsalNote')}</Note>}
      {isGoing && <RunProgress run={run} canCancel={canCancel} />}
      {run.state === 'failed' && (
        <Note tone="attention">
          {t('failed')} {run.failure}
        </Note>
      )}
      {run.state === 'cancelled' && <EmptyState title={t('cancelled.title')} text={t('cancelled.text')} />}
      {run.totals && (
        <>
          <section>
            <h2>{t('ties')}</h2>
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
                nowName={quarterName}
                before={lastQuarter?.distribution ?? null}
                beforeName={lastQuarter?.name ?? null}
              />
            </section>
          </div>
        </>
      )}
      <section>
        <h2>{t('frozen.title')}</h2>
        <p className="quiet">{t('frozen.text')}</p>
        <dl className={styles.facts}>
          <dt>{t('frozen.ledger')}</dt>
          <dd className="figures">{run.ledgerVersion}</dd>
          <dt>{t('frozen.policy')}</dt>
          <dd className="figures">{run.policyVersion}</dd>
          <dt>{t('frozen.engine')}</dt>
          <dd className="figures">{run.engineVersion}</dd>
          <dt>{t('frozen.started')}</dt>
          <dd>
            {run.startedByName} ({t(`via.${run.startedVia}`)}), <Moment at={run.startedAt} />
          </dd>
          {run.finishedAt !== null && (
            <>
              <dt>{t('frozen.finished')}</dt>
              <dd>
                <Moment at={run.finishedAt} />
              </dd>
            </>
          )}
          {run.resultsSha256 !== null && (
            <>
              <dt>{t('frozen.digest')}</dt>
              <dd className={styles.digest}>{run.resultsSha256}</dd>
            </>
          )}
        </dl>
      </section>
    </div>
  );
}
