import { useTranslation } from 'react-i18next';
import { Link, useParams } from 'react-router-dom';
import { ErrorState } from '../../../components/error-state';
import { Loading } from '../../../components/loading';
import { Page } from '../../../components/page';
import { usePlan } from '../../../features/plans/api/use-plan';
import { PlanFacts } from '../../../features/plans/components/plan-facts';
import { PlanQuarters } from '../../../features/plans/components/plan-quarters';
import styles from '../../../features/plans/components/plans.module.css';
import { paths } from '../../paths';

export function Component() {
  const { planId = '' } = useParams();
  const { t } = useTranslation('plans');
  const { data: plan, error, mutate } = usePlan(planId);
  return (
    <Page title={plan?.name ?? t('title')} above={<Link to={paths.plans}>{t('title')}</Link>} lead={plan?.sponsorName}>
      <div className={styles.columns}>
        <section>
          <h2>{t('quarters')}</h2>
          <PlanQuarters planId={planId} quarterPath={paths.quarter} />
        </section>
        <section>
          <h2>{t('setUp')}</h2>
          {plan ? (
            <PlanFacts plan={plan} />
          ) : error ? (
            <ErrorState problem={error} size="inline" onRetry={() => void mutate()} />
          ) : (
            <Loading lines={6} />
          )}
        </section>
      </div>
    </Page>
  );
}
