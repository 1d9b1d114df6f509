import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Link, useLocation } from 'react-router-dom';
import { Mark } from '../mark';
import { HatSwitch } from './hat-switch';
import styles from './page-shell.module.css';
import { PersonMenu } from './person-menu';

interface PageShellProps {
  navigation: readonly { text: string; path: string; covers?: string }[];
  homePath: string;
  /** Language of the content where it differs from the reader's choice: staff screens are in English. */
  contentLanguage?: string | undefined;
  children: ReactNode;
}

/** The entry that the address belongs to: the longest path that begins it. */
function currentEntry<Entry extends { path: string; covers?: string }>(entries: readonly Entry[], pathname: string) {
  const begins = (path: string | undefined) =>
    path !== undefined && (pathname === path || pathname.startsWith(`${path}/`)) ? path.length : 0;
  const reach = (entry: Entry) => Math.max(begins(entry.path), begins(entry.covers));
  const [best] = entries.toSorted((a, b) => reach(b) - reach(a));
  return best && reach(best) > 0 ? best : undefined;
}

/** Header, navigation and main part of every screen behind the sign-in. Plain elements: it is part of everybody's first load. */
export function PageShell({ navigation, homePath, contentLanguage, children }: PageShellProps) {
  const { t } = useTranslation('shell');
  const { pathname } = useLocation();
  const here = currentEntry(navigation, pathname);
  return (
    <>
      <a href="#main" className={styles.skip}>
        {t('skip')}
      </a>
      <header className={`${styles.band} screen-only`}>
        <div className={styles.row}>
          <Link to={homePath} className={styles.name}>
            <Mark />
            <span>Quarterpoise</span>
          </Link>
          <nav aria-label={t('navigation.label')} className={styles.navigation}>
            {navigation.map((item) => (
              <Link
                key={item.path}
                to={item.path}
                className={styles.link}
                aria-current={item === here ? (pathname === item.path ? 'page' : 'true') : undefined}
              >
                {t(`navigation.${item.text}`)}
              </Link>
            ))}
          </nav>
          <div className={styles.person}>
            <HatSwitch />
            <PersonMenu />
          </div>
        </div>
      </header>
      <main id="main" tabIndex={-1} lang={contentLanguage} className={styles.main}>
        {children}
      </main>
    </>
  );
}
