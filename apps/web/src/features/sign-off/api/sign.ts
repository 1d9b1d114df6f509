import { useRevalidate } from '../../../lib/swr';
import { useSubmit } from '../../../lib/use-submit';

export function useSign(quarterId: string) {
  const { submit, ...rest } = useSubmit('sign-off.sign');
  const revalidate = useRevalidate();
  return {
    ...rest,
    async sign(runId: string, remark: string): Promise<boolean> {
      const answer = await submit({ params: { id: quarterId }, body: { runId, remark, confirmed: true } });
      await revalidate('sign-off.sheet', 'quarters.view', 'quarters.list', 'plans.list');
      return answer !== undefined;
    },
  };
}
