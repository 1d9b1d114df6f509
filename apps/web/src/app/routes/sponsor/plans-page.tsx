import { useTranslation } from 'react-i18next';
import { Page } from '../../../components/page';
import { PlanList } from '../../../features/plans/components/plan-list';
import { paths } from '../../paths';

export function Component() {
  const { t } = useTranslation('plans');
  return (
    <Page title={t('title')} lead={t('lead')}>
      <PlanList planPath={paths.plan} quarterPath={paths.quarter} />
    </Page>
  );
}
