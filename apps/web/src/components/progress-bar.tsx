import styles from './progress-bar.module.css';

interface ProgressBarProps {
  label: string;
  /** 0 to 1. */
  share: number;
  /** What the bar says in words; read out on change, at a calm pace. */
  text: string;
}

/** How far long work has come: the poise slides along the beam. */
export function ProgressBar({ label, share, text }: ProgressBarProps) {
  const percent = Math.round(Math.min(Math.max(share, 0), 1) * 100);
  return (
    <div className={styles.progress}>
      <div
        role="progressbar"
        aria-label={label}
        aria-valuemin={0}
        aria-valuemax={100}
        aria-valuenow={percent}
        aria-valuetext={text}
        className={styles.beam}
      >
        <span className={styles.done} style={{ width: `${percent}%` }} />
        <span className={styles.poise} style={{ left: `${percent}%` }} />
      </div>
      <p className={styles.text}>{text}</p>
    </div>
  );
}
