import { useRevalidate } from '../../../lib/swr';
import { useSubmit } from '../../../lib/use-submit';

export function usePublish(quarterId: string) {
  const { submit, ...rest } = useSubmit('publication.publish');
  const revalidate = useRevalidate();
  return {
    ...rest,
    async publish(runId: string): Promise<boolean> {
      const answer = await submit({ params: { id: quarterId }, body: { runId } });
      await revalidate('quarters.view', 'quarters.list', 'plans.list');
      return answer !== undefined;
    },
  };
}
