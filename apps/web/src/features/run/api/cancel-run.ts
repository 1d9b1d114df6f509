import { useRevalidate } from '../../../lib/swr';
import { useSubmit } from '../../../lib/use-submit';

export function useCancelRun(runId: string) {
  const { submit, ...rest } = useSubmit('runs.cancel');
  const revalidate = useRevalidate();
  return {
    ...rest,
    async cancel(): Promise<boolean> {
      const run = await submit({ params: { id: runId } });
      await revalidate('runs.view', 'quarters.view', 'quarters.list', 'plans.list');
      return run !== undefined;
    },
  };
}
