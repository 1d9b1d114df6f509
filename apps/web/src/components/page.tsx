import { useEffect, useRef, type ReactNode } from 'react';
import { useLocation } from 'react-router-dom';
import styles from './page.module.css';

interface PageProps {
  title: string;
  /** Stands above the title: where this screen belongs to, usually a link back. */
  above?: ReactNode;
  /** One or two sentences below the title. */
  lead?: ReactNode;
  /** Beside the title: what can be done on the whole screen. */
  actions?: ReactNode;
  /** Reading width for text, full width for tables. */
  width?: 'reading' | 'working';
  children: ReactNode;
}

/**
 * One screen: sets the document's title and, after a move from another screen, puts the focus on the heading so that screen readers
 * and the keyboard start there.
 */
export function Page({ title, above, lead, actions, width = 'working', children }: PageProps) {
  const heading = useRef<HTMLHeadingElement>(null);
  const { key } = useLocation();
  useEffect(() => {
    document.title = `${title} · Quarterpoise`;
  }, [title]);
  useEffect(() => {
    // "default" is the first screen after a load, where the browser's own starting point is right.
    if (key !== 'default') heading.current?.focus({ preventScroll: true });
  }, [key]);

  return (
    <div className={width === 'reading' ? styles.reading : styles.working}>
      <header className={styles.head}>
        <div>
          {above && <div className={styles.above}>{above}</div>}
          <h1 ref={heading} tabIndex={-1}>
            {title}
          </h1>
          {lead && <div className={styles.lead}>{lead}</div>}
        </div>
        {actions && <div className={`${styles.actions} screen-only`}>{actions}</div>}
      </header>
      {children}
    </div>
  );
}
