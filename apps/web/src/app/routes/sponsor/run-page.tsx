import { useTranslation } from 'react-i18next';
import { Link, useParams } from 'react-router-dom';
import { ErrorState } from '../../../components/error-state';
import { Loading } from '../../../components/loading';
import { Page } from '../../../components/page';
import { useQuarter } from '../../../features/quarter/api/use-quarter';
import { QuarterTrail } from '../../../features/quarter/components/quarter-trail';
import { useRun } from '../../../features/run/api/use-run';
import { RunDetail } from '../../../features/run/components/run-detail';
import { useSignOffSheet } from '../../../features/sign-off/api/use-sign-off-sheet';
import { formatQuarter } from '../../../lib/format';
import { paths } from '../../paths';

export function Component() {
  const { quarterId = '', runId = '' } = useParams();
  const { t, i18n } = useTranslation('run');
  const { data: run, error, mutate } = useRun(runId);
  const { data: quarter } = useQuarter(quarterId);
  // Last quarter's distribution comes with the sign-off sheet, which exists once a run counts.
  const { data: sheet } = useSignOffSheet(run?.state === 'completed' && quarter?.currentRun ? quarterId : null);
  const name = quarter ? formatQuarter(quarter.code, i18n.language) : '';
  const title = `${run?.isRehearsal ? t('rehearsal') : t('run')} · ${name}`;
  return (
    <Page
      title={title}
      above={<QuarterTrail quarterId={quarterId} planPath={paths.plan} quarterPath={paths.quarter(quarterId)} />}
      actions={
        run?.state === 'completed' && (
          <>
            <Link to={paths.review(quarterId, runId)}>{t('review')}</Link>
            <Link to={paths.results(quarterId, runId)}>{t('results')}</Link>
          </>
        )
      }
    >
      {error ? (
        <ErrorState problem={error} onRetry={() => void mutate()} />
      ) : run ? (
        <RunDetail
          run={run}
          quarterName={name}
          lastQuarter={
            sheet?.lastQuarter
              ? {
                  name: formatQuarter(sheet.lastQuarter.code, i18n.language),
                  distribution: sheet.lastQuarter.distribution,
                }
              : null
          }
          canCancel={quarter?.actions.some((entry) => entry.action === 'cancel-run' && entry.allowed) ?? false}
        />
      ) : (
        <Loading lines={8} />
      )}
    </Page>
  );
}
