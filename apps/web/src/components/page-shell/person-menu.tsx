import { useEffect, useRef } from 'react';
import { useSession } from '../../lib/session';
import { LanguageSwitch } from './language-switch';
import styles from './page-shell.module.css';
import { SignOutButton } from './sign-out-button';
import { ThemeSwitch } from './theme-switch';

/** Language, appearance and sign-out behind the person's name; Escape, a press elsewhere or leaving by Tab closes it. */
export function PersonMenu() {
  const { person } = useSession();
  const menu = useRef<HTMLDetailsElement>(null);
  useEffect(() => {
    const element = menu.current;
    if (!element) return;
    const onKeyDown = (event: KeyboardEvent) => {
      if (event.key !== 'Escape' || !element.open) return;
      element.open = false;
      element.querySelector('summary')?.focus();
    };
    const onElsewhere = (event: Event) => {
      if (event.target instanceof Node && !element.contains(event.target)) element.open = false;
    };
    element.addEventListener('keydown', onKeyDown);
    document.addEventListener('pointerdown', onElsewhere);
    document.addEventListener('focusin', onElsewhere);
    return () => {
      element.removeEventListener('keydown', onKeyDown);
      document.removeEventListener('pointerdown', onElsewhere);
      document.removeEventListener('focusin', onElsewhere);
    };
  }, []);
  return (
    <details ref={menu} className={styles.menu}>
      <summary>
        <span className={styles.personName}>{person.displayName}</span>
      </summary>
      <div className={styles.panel}>
        <p className={styles.address}>{person.email}</p>
        <LanguageSwitch />
        <ThemeSwitch />
        <SignOutButton />
      </div>
    </details>
  );
}
