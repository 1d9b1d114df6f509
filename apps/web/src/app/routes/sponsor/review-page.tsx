import { useTranslation } from 'react-i18next';
import { Link, useParams } from 'react-router-dom';
import { Note } from '../../../components/note';
import { Page } from '../../../components/page';
import { useQuarter } from '../../../features/quarter/api/use-quarter';
import { QuarterTrail } from '../../../features/quarter/components/quarter-trail';
import { FlagQueue } from '../../../features/run-review/components/flag-queue';
import { formatQuarter } from '../../../lib/format';
import { useHat } from '../../../lib/session';
import { paths } from '../../paths';

export function Component() {
  const { quarterId = '', runId = '' } = useParams();
  const { t, i18n } = useTranslation(['review', 'results']);
  const { data: quarter } = useQuarter(quarterId);
  const hat = useHat();
  const isRehearsal = quarter?.runs.some((run) => run.id === runId && run.isRehearsal) ?? false;
  const isOpen = quarter?.state === 'in_review' && quarter.currentRun?.id === runId;
  return (
    <Page
      title={quarter ? `${t('review:title')} · ${formatQuarter(quarter.code, i18n.language)}` : t('review:title')}
      above={<QuarterTrail quarterId={quarterId} planPath={paths.plan} quarterPath={paths.quarter(quarterId)} />}
      lead={t('review:lead')}
      actions={<Link to={paths.results(quarterId, runId)}>{t('results:title')}</Link>}
    >
      {isRehearsal && <Note>{t('review:rehearsal')}</Note>}
      {hat !== 'administrator' && <p className="quiet">{t('review:readOnly')}</p>}
      <FlagQueue runId={runId} canDecide={hat === 'administrator' && isOpen} />
    </Page>
  );
}
