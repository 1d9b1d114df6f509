import { useTranslation } from 'react-i18next';
import { Page } from '../../../components/page';
import { HealthReport } from '../../../features/operations/components/health-report';

export function Component() {
  const { t } = useTranslation('operations');
  return (
    <Page title={t('title')} lead={t('lead')} width="reading">
      <HealthReport />
    </Page>
  );
}
