import { useTranslation } from 'react-i18next';
import { Link, useParams } from 'react-router-dom';
import { Moment } from '../../../components/civil-date';
import { EmptyState } from '../../../components/empty-state';
import { ErrorState } from '../../../components/error-state';
import { Loading } from '../../../components/loading';
import { Page } from '../../../components/page';
import { useQuarter } from '../../../features/quarter/api/use-quarter';
import { QuarterTrail } from '../../../features/quarter/components/quarter-trail';
import { ResultTable } from '../../../features/results/components/result-table';
import { useSignOffSheet } from '../../../features/sign-off/api/use-sign-off-sheet';
import { SignOffSheet } from '../../../features/sign-off/components/sign-off-sheet';
import { formatQuarter } from '../../../lib/format';
import { useHat } from '../../../lib/session';
import { paths } from '../../paths';

export function Component() {
  const { quarterId = '' } = useParams();
  const { t, i18n } = useTranslation(['sign-off', 'quarter']);
  const hat = useHat();
  const { data: quarter, error: quarterError, mutate: readAgain } = useQuarter(quarterId);
  const hasRun = quarter?.currentRun != null;
  const { data: sheet, error, mutate } = useSignOffSheet(hasRun ? quarterId : null);
  const problem = quarterError ?? error;
  const signed = quarter?.signOff && sheet && quarter.signOff.runId === sheet.run.id ? quarter.signOff : null;
  return (
    <Page
      title={quarter ? `${t('title')} · ${formatQuarter(quarter.code, i18n.language)}` : t('title')}
      above={<QuarterTrail quarterId={quarterId} planPath={paths.plan} quarterPath={paths.quarter(quarterId)} />}
      lead={t('lead')}
    >
      {problem && <ErrorState problem={problem} onRetry={() => void Promise.all([readAgain(), mutate()])} />}
      {quarter && !hasRun && (
        <EmptyState
          title={t('nothing.title')}
          text={t('nothing.text')}
          action={<Link to={paths.quarter(quarterId)}>{formatQuarter(quarter.code, i18n.language)}</Link>}
        />
      )}
      {!problem && (!quarter || (hasRun && !sheet)) && <Loading lines={10} />}
      {sheet && (
        <SignOffSheet
          sheet={sheet}
          quarterId={quarterId}
          canSign={hat === 'approver'}
          sample={<ResultTable rows={sheet.sample} label={t('sample', { count: sheet.sample.length })} />}
          signed={
            signed && (
              <>
                <p>
                  {t('signedBy', { name: signed.signedByName })} <Moment at={signed.signedAt} />
                </p>
                {signed.remark !== '' && <p>{t('remarkGiven', { remark: signed.remark })}</p>}
                <p>
                  <Link to={paths.publication(quarterId)}>{t('quarter:step.publish.name')}</Link>
                </p>
              </>
            )
          }
        />
      )}
    </Page>
  );
}
