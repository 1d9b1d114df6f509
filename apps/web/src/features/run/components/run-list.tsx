import type { RunSummary } from '@quarterpoise/dto';
import { useTranslation } from 'react-i18next';
import { Link } from 'react-router-dom';
import { Moment } from '../../../components/civil-date';
import styles from './run.module.css';

/** Earlier runs and rehearsals, folded away. */
export function RunList({ runs, runPath }: { runs: readonly RunSummary[]; runPath(runId: string): string }) {
  const { t } = useTranslation('run');
  if (runs.length === 0) return null;
  return (
    <details className={styles.earlier}>
      <summary>{t('earlier', { count: runs.length })}</summary>
      <ul>
        {runs.map((run) => (
          <li key={run.id}>
            <Link to={runPath(run.id)}>{run.isRehearsal ? t('rehearsal') : t('run')}</Link>{' '}
            <Moment at={run.startedAt} />, {t(`state.${run.state}`)}
            {run.failure !== null && `: ${run.failure}`}
          </li>
        ))}
      </ul>
    </details>
  );
}
