import type { RunProgress, RunSummary } from '@quarterpoise/dto';
import { useProgressEvents } from '../../../lib/events';
import { useRevalidate } from '../../../lib/swr';

/** Live progress of a run that is going; when it ends, everything that shows its outcome is read again. */
export function useRunProgress(run: Pick<RunSummary, 'id' | 'state'>) {
  const revalidate = useRevalidate();
  const isGoing = run.state === 'queued' || run.state === 'computing';
  return useProgressEvents<RunProgress>('runs.events', run.id, isGoing, () => {
    void revalidate('runs.view', 'quarters.view', 'quarters.list', 'plans.list');
  });
}
