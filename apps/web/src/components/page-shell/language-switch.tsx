import { useTranslation } from 'react-i18next';
import { chooseLanguage, LANGUAGES, type Language } from '../../i18n/i18n';
import { request } from '../../lib/api-client';
import { useSessionState } from '../../lib/session';
import styles from './page-shell.module.css';

/** Language of the screens; remembered on this device and, when signed in, with the person. */
export function LanguageSwitch() {
  const { t, i18n } = useTranslation('shell');
  const { session, begin } = useSessionState();
  return (
    <label className={styles.field}>
      {t('language.label')}
      <select
        value={i18n.language}
        onChange={async (event) => {
          const language = event.target.value as Language;
          await chooseLanguage(language);
          // The screens have changed already; when this fails, the next sign-in simply starts in the old language.
          if (session) await request('identity.choose-language', { body: { language } }).then(begin, () => undefined);
        }}
      >
        {LANGUAGES.map((language) => (
          <option key={language} value={language} lang={language}>
            {t(`language.${language}`)}
          </option>
        ))}
      </select>
    </label>
  );
}
