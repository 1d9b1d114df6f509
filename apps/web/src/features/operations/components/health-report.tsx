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
      {data.parts.length > 0 && (
        <ul className={styles.parts}>
          {data.parts.map((part) => (
            <li key={part.name}>
              <span>{t(`part.${part.name}`, { defaultValue: part.name })}</span>
              <span className={part.isUp ? styles.up : styles.down}>
                {part.isUp ? t('up') : t('down', { detail: part.detail })}
              </span>
            </li>
          ))}
        </ul>
      )}
      <p className="quiet">{t('refresh')}</p>
    </div>
  );
}
