import type { ReactNode } from 'react';
import styles from './states.module.css';

/** Nothing here yet, and what to do next. */
export function EmptyState({ title, text, action }: { title: string; text?: ReactNode; action?: ReactNode }) {
  return (
    <div className={styles.empty}>
      <h2>{title}</h2>
      {text && <p className="quiet">{text}</p>}
      {action}
    </div>
  );
}
