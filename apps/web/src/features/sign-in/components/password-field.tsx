import { useState, type Ref } from 'react';
import { useTranslation } from 'react-i18next';
import styles from './sign-in.module.css';

interface PasswordFieldProps {
  ref: Ref<HTMLInputElement>;
  value: string;
  isInvalid: boolean;
  fault: string | null;
  onChange(value: string): void;
}

export function PasswordField({ ref, value, isInvalid, fault, onChange }: PasswordFieldProps) {
  const { t } = useTranslation('sign-in');
  const [isShown, setShown] = useState(false);
  return (
    <div className={styles.field}>
      <label htmlFor="sign-in-password">{t('password')}</label>
      <div className={styles.passwordRow}>
        <input
          id="sign-in-password"
          ref={ref}
          type={isShown ? 'text' : 'password'}
          autoComplete="current-password"
          value={value}
          aria-invalid={isInvalid}
          aria-describedby="sign-in-password-fault"
          onChange={(event) => onChange(event.target.value)}
        />
        <button type="button" aria-pressed={isShown} className={styles.show} onClick={() => setShown(!isShown)}>
          {isShown ? t('hide') : t('show')}
        </button>
      </div>
      <p id="sign-in-password-fault" role="alert" className={styles.fault}>
        {fault}
      </p>
    </div>
  );
}
