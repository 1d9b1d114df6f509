import { useTranslation } from 'react-i18next';
import { CivilDate } from './civil-date';
import styles from './due-date.module.css';

/** A date by which something is due, with the days left in words; near and past ones stand out in brass and brick. */
export function DueDate({ date, daysLeft }: { date: string; daysLeft: number }) {
  const { t } = useTranslation('shell');
  const tone = daysLeft < 0 ? styles.past : daysLeft <= 14 ? styles.near : undefined;
  const text =
    daysLeft < 0
      ? t('due.past', { count: -daysLeft })
      : daysLeft === 0
        ? t('due.today')
        : t('due.left', { count: daysLeft });
  return (
    <span className={tone}>
      <CivilDate date={date} /> <span className={styles.left}>({text})</span>
    </span>
  );
}
