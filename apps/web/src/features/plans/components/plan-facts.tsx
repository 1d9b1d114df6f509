import type { PlanView } from '@quarterpoise/dto';
import { useTranslation } from 'react-i18next';
import { CivilDate } from '../../../components/civil-date';
import { formatCount } from '../../../lib/format';
import styles from './plans.module.css';

const SHOWN = [
  'flowTiming',
  'flowDate',
  'lateEffective',
  'fees',
  'loans',
  'forfeitures',
  'adjustments',
  'yearToDate',
] as const;

/** What the plan has set: the records, the due date and the return policy in force, in words. */
export function PlanFacts({ plan }: { plan: PlanView }) {
  const { t, i18n } = useTranslation('plans');
  const { options } = plan.policy;
  return (
    <dl className={styles.facts}>
      <dt>{t('facts.code')}</dt>
      <dd>{plan.code}</dd>
      <dt>{t('facts.accounts')}</dt>
      <dd className="figures">{formatCount(plan.accountCount, i18n.language)}</dd>
      <dt>{t('facts.recordsBegin')}</dt>
      <dd>
        <CivilDate date={plan.recordsBeginOn} />
      </dd>
      <dt>{t('facts.due')}</dt>
      <dd>{t('facts.dueDays', { count: plan.statementDueDays })}</dd>
      <dt>{t('facts.policy')}</dt>
      <dd>
        {t('facts.policyVersion', { version: plan.policy.version })} <CivilDate date={plan.policy.effectiveFrom} />
      </dd>
      {SHOWN.map((name) => (
        <PolicyFact key={name} name={name} value={options[name]} />
      ))}
    </dl>
  );
}

function PolicyFact({ name, value }: { name: (typeof SHOWN)[number]; value: string }) {
  const { t } = useTranslation('plans');
  return (
    <>
      <dt>{t(`policy.${name}.label`)}</dt>
      <dd>{t(`policy.${name}.${value}`)}</dd>
    </>
  );
}
