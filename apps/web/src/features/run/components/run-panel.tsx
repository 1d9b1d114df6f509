import type { QuarterView } from '@quarterpoise/dto';
import { useTranslation } from 'react-i18next';
import { Note } from '../../../components/note';
import { RunOutcome } from './run-outcome';
import { RunProgress } from './run-progress';
import { RunList } from './run-list';
import { StartRun } from './start-run';

interface RunPanelProps {
  quarter: QuarterView;
  runPath(runId: string): string;
}

/** The run's part of the quarter's page: what is going, how the newest came out, and starting another. */
export function RunPanel({ quarter, runPath }: RunPanelProps) {
  const { t } = useTranslation('run');
  const action = (name: 'run' | 'rehearse' | 'cancel-run') => quarter.actions.find((entry) => entry.action === name);
  const going = quarter.runs.filter((run) => run.state === 'queued' || run.state === 'computing');
  const isStale = quarter.findings.some((finding) => finding.code === 'figures-stale');
  return (
    <>
      {going.map((run) => (
        <div key={run.id}>
          <h3>{run.isRehearsal ? t('rehearsalGoing') : t('runGoing')}</h3>
          <RunProgress run={run} canCancel={action('cancel-run')?.allowed ?? false} />
        </div>
      ))}
      {isStale && <Note tone="attention">{t('stale')}</Note>}
      {quarter.currentRun && <RunOutcome run={quarter.currentRun} path={runPath(quarter.currentRun.id)} />}
      {!going.some((run) => !run.isRehearsal) && (
        <StartRun
          quarterId={quarter.id}
          run={action('run')}
          rehearse={action('rehearse')}
          isAgain={quarter.currentRun !== null}
        />
      )}
      <RunList
        runs={quarter.runs.filter((run) => run.id !== quarter.currentRun?.id && !going.includes(run))}
        runPath={runPath}
      />
    </>
  );
}
