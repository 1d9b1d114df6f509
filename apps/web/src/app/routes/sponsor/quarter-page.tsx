import type { QuarterView } from '@quarterpoise/dto';
import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { useParams } from 'react-router-dom';
import { ErrorState } from '../../../components/error-state';
import { Loading } from '../../../components/loading';
import { Page } from '../../../components/page';
import { PublishPanel } from '../../../features/publication/components/publish-panel';
import { useQuarter } from '../../../features/quarter/api/use-quarter';
import { CheckStep } from '../../../features/quarter/components/check-step';
import { CollectStep } from '../../../features/quarter/components/collect-step';
import { QuarterHistory } from '../../../features/quarter/components/quarter-history';
import { QuarterStanding } from '../../../features/quarter/components/quarter-standing';
import { QuarterSteps } from '../../../features/quarter/components/quarter-steps';
import { QuarterTrail } from '../../../features/quarter/components/quarter-trail';
import { ReviewStep } from '../../../features/quarter/components/review-step';
import { SignOffStep } from '../../../features/quarter/components/sign-off-step';
import styles from '../../../features/quarter/components/quarter.module.css';
import type { Step } from '../../../features/quarter/lib/steps';
import { RunPanel } from '../../../features/run/components/run-panel';
import { formatQuarter } from '../../../lib/format';
import { paths } from '../../paths';

/** The sponsor's home: one quarter as a list to work down. */
export function Component() {
  const { quarterId = '' } = useParams();
  const { t, i18n } = useTranslation('quarter');
  const { data: quarter, error, mutate } = useQuarter(quarterId);
  return (
    <Page
      title={quarter ? `${formatQuarter(quarter.code, i18n.language)}: ${t(`state.${quarter.state}`)}` : t('quarter')}
      above={<QuarterTrail quarterId={quarterId} planPath={paths.plan} />}
      lead={quarter && <QuarterStanding quarter={quarter} />}
    >
      {quarter ? (
        <div className={styles.layout}>
          <QuarterSteps quarter={quarter} content={stepContent(quarter)} />
          <QuarterHistory history={quarter.history} />
        </div>
      ) : error ? (
        <ErrorState problem={error} onRetry={() => void mutate()} />
      ) : (
        <Loading lines={10} />
      )}
    </Page>
  );
}

function stepContent(quarter: QuarterView): Record<Step, ReactNode> {
  const run = quarter.currentRun;
  return {
    collect: (
      <CollectStep
        quarter={quarter}
        filesPath={paths.files(quarter.id)}
        filePath={(id) => paths.file(quarter.id, id)}
      />
    ),
    check: <CheckStep quarter={quarter} />,
    run: <RunPanel quarter={quarter} runPath={(id) => paths.run(quarter.id, id)} />,
    review: (
      <ReviewStep
        run={run}
        reviewPath={run ? paths.review(quarter.id, run.id) : ''}
        resultsPath={run ? paths.results(quarter.id, run.id) : ''}
      />
    ),
    'sign-off': <SignOffStep quarter={quarter} path={paths.signOff(quarter.id)} />,
    publish: <PublishPanel quarter={quarter} />,
  };
}
