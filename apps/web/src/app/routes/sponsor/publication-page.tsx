import { useTranslation } from 'react-i18next';
import { useParams } from 'react-router-dom';
import { ErrorState } from '../../../components/error-state';
import { Loading } from '../../../components/loading';
import { Page } from '../../../components/page';
import { PublishPanel } from '../../../features/publication/components/publish-panel';
import { useQuarter } from '../../../features/quarter/api/use-quarter';
import { QuarterTrail } from '../../../features/quarter/components/quarter-trail';
import { formatQuarter } from '../../../lib/format';
import { paths } from '../../paths';

export function Component() {
  const { quarterId = '' } = useParams();
  const { t, i18n } = useTranslation('publication');
  const { data: quarter, error, mutate } = useQuarter(quarterId);
  return (
    <Page
      title={quarter ? `${t('title')} · ${formatQuarter(quarter.code, i18n.language)}` : t('title')}
      above={<QuarterTrail quarterId={quarterId} planPath={paths.plan} quarterPath={paths.quarter(quarterId)} />}
      lead={t('lead')}
      width="reading"
    >
      {error && <ErrorState problem={error} onRetry={() => void mutate()} />}
      {!quarter && !error && <Loading />}
      {quarter && <PublishPanel quarter={quarter} />}
    </Page>
  );
}
