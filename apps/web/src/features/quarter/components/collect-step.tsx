import type { QuarterView } from '@quarterpoise/dto';
import { useTranslation } from 'react-i18next';
import { LinkButton } from '../../../components/link-button';
import { FileList } from './file-list';

interface CollectStepProps {
  quarter: QuarterView;
  filesPath: string;
  filePath(importId: string): string;
}

export function CollectStep({ quarter, filesPath, filePath }: CollectStepProps) {
  const { t } = useTranslation('quarter');
  const action = quarter.actions.find((entry) => entry.action === 'import');
  return (
    <>
      <FileList files={quarter.files} filePath={filePath} />
      <div>
        {action?.allowed ? (
          <LinkButton to={filesPath} isPrimary={quarter.state === 'collecting'}>
            {t('loadFiles')}
          </LinkButton>
        ) : (
          <LinkButton to={filesPath}>{t('seeFiles')}</LinkButton>
        )}
      </div>
    </>
  );
}
