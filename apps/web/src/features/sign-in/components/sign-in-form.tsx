import type { SessionView } from '@quarterpoise/dto';
import { useEffect, useRef, useState, type SubmitEvent } from 'react';
import { useTranslation } from 'react-i18next';
import { ErrorState } from '../../../components/error-state';
import { useSubmit } from '../../../lib/use-submit';
import { DemoAccounts } from './demo-accounts';
import { PasswordField } from './password-field';
import styles from './sign-in.module.css';
import { useWait } from './use-wait';

/** Plain fields: everybody passes here, on slow lines too. */
export function SignInForm({ onSignedIn }: { onSignedIn(session: SessionView): void }) {
  const { t } = useTranslation('sign-in');
  const { submit, isBusy, problem, clearProblem } = useSubmit('identity.sign-in');
  const [email, setEmail] = useState('');
  const [password, setPassword] = useState('');
  const [missing, setMissing] = useState<{ email: boolean; password: boolean }>({ email: false, password: false });
  const emailField = useRef<HTMLInputElement>(null);
  const passwordField = useRef<HTMLInputElement>(null);
  const secondsLeft = useWait(problem?.code === 'too-many-requests' ? (problem.retryAfterSeconds ?? 60) : 0, problem);

  useEffect(() => {
    // Bad credentials belong to both fields; the password is the one that is typed again.
    if (problem?.code === 'wrong-credentials') passwordField.current?.select();
  }, [problem]);

  async function onSubmit(event: SubmitEvent<HTMLFormElement>) {
    event.preventDefault();
    const isEmailMissing = !/^\S+@\S+$/.test(email.trim());
    setMissing({ email: isEmailMissing, password: password === '' });
    if (isEmailMissing) return emailField.current?.focus();
    if (password === '') return passwordField.current?.focus();
    const session = await submit({ body: { email: email.trim(), password } });
    if (session) onSignedIn(session);
  }

  const isWrong = problem?.code === 'wrong-credentials';
  return (
    <>
      <form noValidate className={styles.form} onSubmit={(event) => void onSubmit(event)}>
        <div className={styles.field}>
          <label htmlFor="sign-in-email">{t('email')}</label>
          <input
            id="sign-in-email"
            ref={emailField}
            type="email"
            autoComplete="username"
            inputMode="email"
            value={email}
            aria-invalid={missing.email || isWrong}
            aria-describedby="sign-in-email-fault"
            onChange={(event) => setEmail(event.target.value)}
          />
          <p id="sign-in-email-fault" className={styles.fault}>
            {missing.email && t('emailNeeded')}
          </p>
        </div>
        <PasswordField
          ref={passwordField}
          value={password}
          isInvalid={missing.password || isWrong}
          fault={missing.password ? t('passwordNeeded') : isWrong ? t('wrong') : null}
          onChange={setPassword}
        />
        {problem && !isWrong && secondsLeft === 0 && problem.code !== 'too-many-requests' && (
          <ErrorState problem={problem} size="inline" />
        )}
        {secondsLeft > 0 && (
          <p role="alert" className={styles.wait}>
            {t('wait', { count: secondsLeft })}
          </p>
        )}
        <button type="submit" className={styles.submit} disabled={isBusy || secondsLeft > 0}>
          {isBusy ? t('busy') : t('submit')}
        </button>
      </form>
      <DemoAccounts
        onChoose={(account) => {
          clearProblem();
          setMissing({ email: false, password: false });
          setEmail(account.email);
          setPassword(account.password);
        }}
      />
    </>
  );
}
