import { useTranslation } from 'react-i18next';
import styles from './loading.module.css';

/** Grey lines where text will stand. Plain elements, since it is what everybody sees first. */
export function Loading({ lines = 4 }: { lines?: number }) {
  const { t } = useTranslation('shell');
  return (
    <div role="status" className={styles.lines}>
      <span className="visually-hidden">{t('loading')}</span>
      {Array.from({ length: lines }, (_, line) => (
        <span key={line} className={styles.line} aria-hidden="true" />
      ))}
    </div>
  );
}

export function LoadingPage() {
  return (
    <div className={styles.page}>
      <Loading lines={6} />
    </div>
  );
}
