import type { PlanSummary } from '@quarterpoise/dto';
import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Link } from 'react-router-dom';
import { DueDate } from '../../../components/due-date';
import { EmptyState } from '../../../components/empty-state';
import { ErrorState } from '../../../components/error-state';
import { Loading } from '../../../components/loading';
import { daysBetween, today } from '../../../lib/days';
import { formatCount, formatQuarter } from '../../../lib/format';
import { usePlans } from '../api/use-plans';
import styles from './plans.module.css';

interface PlanListProps {
  planPath(planId: string): string;
  quarterPath(quarterId: string): string;
}

/** The plans as a list to work down: for each, what is open, where it stands and by when. */
export function PlanList({ planPath, quarterPath }: PlanListProps) {
  const { t } = useTranslation('plans');
  const { data, error, isLoading, mutate } = usePlans();
  if (error) return <ErrorState problem={error} onRetry={() => void mutate()} />;
  if (isLoading || !data) return <Loading lines={6} />;
  if (data.items.length === 0) return <EmptyState title={t('empty.title')} text={t('empty.text')} />;
  return (
    <ul className={styles.plans}>
      {data.items.map((plan) => (
        <PlanRow key={plan.id} plan={plan} planPath={planPath(plan.id)} quarterPath={quarterPath} />
      ))}
    </ul>
  );
}

interface PlanRowProps {
  plan: PlanSummary;
  planPath: string;
  quarterPath(quarterId: string): string;
}

function PlanRow({ plan, planPath, quarterPath }: PlanRowProps) {
  const { t, i18n } = useTranslation(['plans', 'quarter']);
  const { openQuarter } = plan;
  let standing: ReactNode = <p className="quiet">{t('plans:nothingOpen')}</p>;
  if (openQuarter) {
    standing = (
      <div className={styles.standing}>
        <Link to={quarterPath(openQuarter.id)} className={styles.quarter}>
          {formatQuarter(openQuarter.code, i18n.language)}: {t(`quarter:state.${openQuarter.state}`)}
        </Link>
        <p>
          {t('plans:due')} <DueDate date={openQuarter.dueOn} daysLeft={daysBetween(today(), openQuarter.dueOn)} />
        </p>
      </div>
    );
  }
  return (
    <li className={styles.plan}>
      <div>
        <h2>
          <Link to={planPath}>{plan.name}</Link>
        </h2>
        <p className="quiet">
          {plan.sponsorName},{' '}
          {t('plans:accounts', { count: plan.accountCount, number: formatCount(plan.accountCount, i18n.language) })}
        </p>
      </div>
      {standing}
    </li>
  );
}
