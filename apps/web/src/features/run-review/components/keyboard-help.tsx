import { useTranslation } from 'react-i18next';
import styles from './run-review.module.css';

const KEYS = ['j', 'k', 'x', 'a', 'h', 'r'] as const;

export function KeyboardHelp() {
  const { t } = useTranslation('review');
  return (
    <p className={styles.keys}>
      {KEYS.map((key) => (
        <span key={key}>
          <kbd>{key}</kbd> {t(`keys.${key}`)}
        </span>
      ))}
    </p>
  );
}
