import type { ReactNode } from 'react';
import { Link } from 'react-router-dom';
import styles from './link-button.module.css';

/** A way to another screen that is the thing to do here; still a link, so that it opens in a new tab and is read out as one. */
export function LinkButton({
  to,
  isPrimary = false,
  children,
}: {
  to: string;
  isPrimary?: boolean;
  children: ReactNode;
}) {
  return (
    <Link to={to} className={isPrimary ? styles.primary : styles.plain}>
      {children}
    </Link>
  );
}
