import { useTranslation } from 'react-i18next';
import { ErrorState } from '../../../components/error-state';
import { Loading } from '../../../components/loading';
import { useHealth } from '../api/use-health';
import styles from './health.module.css';

/** Whether the service is ready, part by part; read again every ten seconds. */
export function HealthReport() {
  const { t } = useTranslation('operations');
  const { data, error, mutate } = useHealth();
  if (error) return <ErrorState problem={error} onRetry={() => void mutate()} />;
  if (!data) return <Loading />;
  return (
    <div className={styles.report}>
      <p role="status" className={data.isReady ? styles.up : styles.down}>
        {data.isReady ? t('ready') : t('notReady')}
      </p>
      <ul className={styles.parts}>
        {Object.entries(data.checks).map(([name, state]) => (
          <li key={name}>
            <span>{t(`part.${name}`, { defaultValue: name })}</span>
            <span className={state === 'up' ? styles.up : styles.down}>{t(`state.${state}`)}</span>
          </li>
        ))}
      </ul>
      <p className="quiet">{t('refresh')}</p>
    </div>
  );
}
