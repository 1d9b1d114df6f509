import type { RunSummary } from '@quarterpoise/dto';
import { useRevalidate } from '../../../lib/swr';
import { useSubmit } from '../../../lib/use-submit';

/** Starts a run or a rehearsal; the quarter's page and the plan's quarters are read again. */
export function useStartRun(quarterId: string) {
  const { submit, ...rest } = useSubmit('runs.start');
  const revalidate = useRevalidate();
  return {
    ...rest,
    async start(isRehearsal: boolean): Promise<RunSummary | undefined> {
      const run = await submit({ params: { id: quarterId }, body: { isRehearsal } });
      await revalidate('quarters.view', 'quarters.list', 'plans.list');
      return run;
    },
  };
}
