import { useTranslation } from 'react-i18next';
import { Link } from 'react-router-dom';
import { Moment } from '../../../components/civil-date';
import { DueDate } from '../../../components/due-date';
import { EmptyState } from '../../../components/empty-state';
import { ErrorState } from '../../../components/error-state';
import { Loading } from '../../../components/loading';
import { daysBetween, today } from '../../../lib/days';
import { formatQuarter } from '../../../lib/format';
import { usePlanQuarters } from '../api/use-plan-quarters';
import styles from './plans.module.css';

export function PlanQuarters({ planId, quarterPath }: { planId: string; quarterPath(quarterId: string): string }) {
  const { t, i18n } = useTranslation(['plans', 'quarter']);
  const { data, error, isLoading, mutate } = usePlanQuarters(planId);
  if (error) return <ErrorState problem={error} onRetry={() => void mutate()} />;
  if (isLoading || !data) return <Loading lines={5} />;
  if (data.items.length === 0) {
    return <EmptyState title={t('plans:noQuarters.title')} text={t('plans:noQuarters.text')} />;
  }
  return (
    <ul className={styles.quarters}>
      {data.items.map((quarter) => (
        <li key={quarter.id}>
          <Link to={quarterPath(quarter.id)} className={styles.quarter}>
            {formatQuarter(quarter.code, i18n.language)}
          </Link>
          <span>{t(`quarter:state.${quarter.state}`)}</span>
          <span className="quiet">
            {quarter.publishedAt ? (
              <>
                {t('plans:publishedOn')} <Moment at={quarter.publishedAt} />
              </>
            ) : (
              <>
                {t('plans:due')} <DueDate date={quarter.dueOn} daysLeft={daysBetween(today(), quarter.dueOn)} />
              </>
            )}
          </span>
        </li>
      ))}
    </ul>
  );
}
