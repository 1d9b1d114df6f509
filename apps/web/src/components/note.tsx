import type { ReactNode } from 'react';
import styles from './states.module.css';

/** A sentence set apart: something to know (spruce) or something to see to (brass). Said in words; the colour only repeats it. */
export function Note({ tone = 'notice', children }: { tone?: 'notice' | 'attention'; children: ReactNode }) {
  return <div className={tone === 'notice' ? styles.noteNotice : styles.noteAttention}>{children}</div>;
}
