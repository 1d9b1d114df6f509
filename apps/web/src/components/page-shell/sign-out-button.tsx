import { useTranslation } from 'react-i18next';
import { useSignOut } from '../../lib/session';
import styles from './page-shell.module.css';

export function SignOutButton() {
  const { t } = useTranslation('shell');
  const signOut = useSignOut();
  return (
    <button type="button" className={styles.signOut} onClick={() => void signOut()}>
      {t('signOut')}
    </button>
  );
}
