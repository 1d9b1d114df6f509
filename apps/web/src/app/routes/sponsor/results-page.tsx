import { useTranslation } from 'react-i18next';
import { Link, useParams } from 'react-router-dom';
import { Page } from '../../../components/page';
import { useQuarter } from '../../../features/quarter/api/use-quarter';
import { QuarterTrail } from '../../../features/quarter/components/quarter-trail';
import { ResultSearch } from '../../../features/results/components/result-search';
import { formatQuarter } from '../../../lib/format';
import { paths } from '../../paths';

export function Component() {
  const { quarterId = '', runId = '' } = useParams();
  const { t, i18n } = useTranslation(['results', 'review']);
  const { data: quarter } = useQuarter(quarterId);
  return (
    <Page
      title={quarter ? `${t('results:title')} · ${formatQuarter(quarter.code, i18n.language)}` : t('results:title')}
      above={<QuarterTrail quarterId={quarterId} planPath={paths.plan} quarterPath={paths.quarter(quarterId)} />}
      actions={<Link to={paths.review(quarterId, runId)}>{t('review:title')}</Link>}
    >
      <ResultSearch runId={runId} />
    </Page>
  );
}
