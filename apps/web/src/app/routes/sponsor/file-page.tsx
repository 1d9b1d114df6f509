import { useTranslation } from 'react-i18next';
import { Link, useParams } from 'react-router-dom';
import { Page } from '../../../components/page';
import { useImport } from '../../../features/imports/api/use-import';
import { LiveImport } from '../../../features/imports/components/live-import';
import { QuarterTrail } from '../../../features/quarter/components/quarter-trail';
import { paths } from '../../paths';

export function Component() {
  const { quarterId = '', importId = '' } = useParams();
  const { t } = useTranslation('imports');
  const { data: file } = useImport(importId);
  return (
    <Page
      title={file ? t(`kind.${file.kind}`) : t('title')}
      above={<QuarterTrail quarterId={quarterId} planPath={paths.plan} quarterPath={paths.quarter(quarterId)} />}
      actions={<Link to={paths.files(quarterId)}>{t('history.title')}</Link>}
    >
      <LiveImport importId={importId} />
    </Page>
  );
}
