import { useTranslation } from 'react-i18next';
import { useParams } from 'react-router-dom';
import { ErrorState } from '../../../components/error-state';
import { Loading } from '../../../components/loading';
import { Page } from '../../../components/page';
import { useImports } from '../../../features/imports/api/use-imports';
import { ImportHistory } from '../../../features/imports/components/import-history';
import styles from '../../../features/imports/components/imports.module.css';
import { UploadArea } from '../../../features/imports/components/upload-area';
import { useQuarter } from '../../../features/quarter/api/use-quarter';
import { QuarterTrail } from '../../../features/quarter/components/quarter-trail';
import { formatQuarter } from '../../../lib/format';
import { useHat } from '../../../lib/session';
import { paths } from '../../paths';

export function Component() {
  const { quarterId = '' } = useParams();
  const { t, i18n } = useTranslation('imports');
  const { data: quarter, error, mutate } = useQuarter(quarterId);
  return (
    <Page
      title={quarter ? `${t('title')} · ${formatQuarter(quarter.code, i18n.language)}` : t('title')}
      above={<QuarterTrail quarterId={quarterId} planPath={paths.plan} quarterPath={paths.quarter(quarterId)} />}
      lead={t('lead')}
    >
      {error && <ErrorState problem={error} onRetry={() => void mutate()} />}
      {!quarter && !error && <Loading lines={6} />}
      {quarter && <Files planId={quarter.planId} quarterId={quarterId} />}
    </Page>
  );
}

function Files({ planId, quarterId }: { planId: string; quarterId: string }) {
  const { t } = useTranslation('imports');
  const hat = useHat();
  const imports = useImports(planId, quarterId);
  const filePath = (importId: string) => paths.file(quarterId, importId);
  return (
    <div className={styles.areas}>
      {hat === 'administrator' ? (
        <UploadArea
          planId={planId}
          quarterId={quarterId}
          filePath={filePath}
          onChanged={() => void imports.refresh()}
        />
      ) : (
        <p className="quiet">{t('readOnly')}</p>
      )}
      <ImportHistory imports={imports} filePath={filePath} />
    </div>
  );
}
