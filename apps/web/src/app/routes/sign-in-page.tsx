import { useEffect } from 'react';
import { useTranslation } from 'react-i18next';
import { Navigate, useLocation } from 'react-router-dom';
import { Mark } from '../../components/mark';
import { LanguageSwitch } from '../../components/page-shell/language-switch';
import { ThemeSwitch } from '../../components/page-shell/theme-switch';
import { SignInForm } from '../../features/sign-in/components/sign-in-form';
import { chooseLanguage } from '../../i18n/i18n';
import { useSessionState } from '../../lib/session';
import { returnAddress } from '../paths';
import styles from './sign-in-page.module.css';

export function Component() {
  const { t } = useTranslation('sign-in');
  const { session, begin } = useSessionState();
  const { search } = useLocation();
  useEffect(() => {
    document.title = `${t('title')} · Quarterpoise`;
  }, [t]);
  if (session) return <Navigate to={returnAddress(search)} replace />;
  return (
    <div className={styles.page}>
      <header className={styles.band}>
        <div className={styles.name}>
          <Mark size={40} />
          <span>Quarterpoise</span>
        </div>
        <p className={styles.sentence}>{t('sentence')}</p>
      </header>
      <main className={styles.main}>
        <h1>{t('title')}</h1>
        {search.includes('return=') && <p className="quiet">{t('returning')}</p>}
        <SignInForm
          onSignedIn={(found) => {
            void chooseLanguage(found.person.language);
            begin(found);
          }}
        />
        <div className={styles.switches}>
          <LanguageSwitch />
          <ThemeSwitch />
        </div>
      </main>
    </div>
  );
}
