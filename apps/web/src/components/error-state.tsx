import { useTranslation } from 'react-i18next';
import type { ProblemError } from '../lib/problem';
import styles from './states.module.css';

interface ErrorStateProps {
  problem: ProblemError;
  onRetry?: () => void;
  /** `page` stands in place of a screen; `inline` beside what was tried. */
  size?: 'page' | 'inline';
}

/** What went wrong, what it was about, and what to do. The service's own detail is English, so other languages leave it out. */
export function ErrorState({ problem, onRetry, size = 'page' }: ErrorStateProps) {
  const { t, i18n } = useTranslation(['shell', 'problems']);
  const title = t(`problems:${problem.code}.title`);
  const hasDetail = problem.detail !== '' && problem.detail !== title && i18n.language.startsWith('en');
  return (
    <div role="alert" className={size === 'page' ? styles.errorPage : styles.errorInline}>
      <p className={styles.title}>{title}</p>
      {hasDetail && <p>{problem.detail}</p>}
      <p>{t(`problems:${problem.code}.remedy`)}</p>
      {problem.retryAfterSeconds !== null && (
        <p>{t('shell:retryAfter', { count: Math.ceil(problem.retryAfterSeconds) })}</p>
      )}
      {problem.errors.length > 0 && (
        <ul className={styles.faults}>
          {problem.errors.map((fault) => (
            <li key={`${fault.pointer} ${fault.code}`}>
              <code>{fault.pointer}</code>: {fault.detail}
            </li>
          ))}
        </ul>
      )}
      {problem.requestId !== null && problem.status >= 500 && (
        <p className={styles.requestId}>{t('shell:requestId', { id: problem.requestId })}</p>
      )}
      {onRetry && (
        <button type="button" className={styles.retry} onClick={onRetry}>
          {t('shell:retry')}
        </button>
      )}
    </div>
  );
}
