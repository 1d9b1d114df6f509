import type { demoAccounts } from '@quarterpoise/dto';
import { useTranslation } from 'react-i18next';
import type { z } from 'zod';
import { useDemoAccounts } from '../api/use-demo-accounts';
import styles from './sign-in.module.css';

export type DemoAccount = z.infer<typeof demoAccounts>['items'][number];

/** In a demo: one invented person per role; choosing one fills the form in. Nothing at all otherwise. */
export function DemoAccounts({ onChoose }: { onChoose(account: DemoAccount): void }) {
  const { t } = useTranslation(['sign-in', 'shell']);
  const { data } = useDemoAccounts();
  if (!data || data.items.length === 0) return null;
  return (
    <section className={styles.demo} aria-labelledby="demo-heading">
      <h2 id="demo-heading">{t('sign-in:demo.title')}</h2>
      <p className="quiet">{t('sign-in:demo.text')}</p>
      <ul>
        {data.items.map((account) => (
          <li key={`${account.email} ${account.hat}`}>
            <button type="button" onClick={() => onChoose(account)}>
              <span className={styles.demoHat}>{t(`shell:hat.${account.hat}`)}</span>
              <span className="quiet">
                {account.displayName}, {account.organisation}
              </span>
            </button>
          </li>
        ))}
      </ul>
    </section>
  );
}
