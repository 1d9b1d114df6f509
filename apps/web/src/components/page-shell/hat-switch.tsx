import type { Hat } from '@quarterpoise/dto';
import { useTranslation } from 'react-i18next';
import { useNavigate } from 'react-router-dom';
import { useSession, useSessionState } from '../../lib/session';
import { useSubmit } from '../../lib/use-submit';
import styles from './page-shell.module.css';

/** The role in which one acts just now, said plainly; a choice when there are several. Changing it goes to that role's home. */
export function HatSwitch() {
  const { t } = useTranslation('shell');
  const { hat, hats } = useSession();
  const { begin } = useSessionState();
  const { submit, isBusy, problem } = useSubmit('identity.choose-hat');
  const navigate = useNavigate();

  if (hats.length < 2) {
    return (
      <span className={styles.hat}>
        <span className="visually-hidden">{t('hat.label')}</span>
        <span className={styles.worn}>{t(`hat.${hat}`)}</span>
      </span>
    );
  }
  return (
    <label className={styles.hat}>
      <span className={styles.hatLabel}>{t('hat.label')}</span>
      <select
        aria-label={t('hat.label')}
        aria-invalid={problem !== null}
        title={problem ? t(`problems:${problem.code}.title`) : undefined}
        value={hat}
        disabled={isBusy}
        onChange={async (event) => {
          const session = await submit({ body: { hat: event.target.value as Hat } });
          if (!session) return;
          begin(session);
          await navigate('/');
        }}
      >
        {hats.map((one) => (
          <option key={one} value={one}>
            {t(`hat.${one}`)}
          </option>
        ))}
      </select>
    </label>
  );
}
