import type { FlagRow } from '@quarterpoise/dto';
import { useRevalidate } from '../../../lib/swr';
import { useSubmit } from '../../../lib/use-submit';

export type Decision = NonNullable<FlagRow['decision']>['decision'];

export interface DecisionInput {
  flagIds: string[];
  decision: Decision;
  reason: string;
  message?: string;
}

/** Decides flags of one run. The list of flags is paged, so its own refresh comes from the caller. */
export function useDecideFlags(runId: string, refreshFlags: () => Promise<unknown>) {
  const { submit, ...rest } = useSubmit('review.decide');
  const revalidate = useRevalidate();
  return {
    ...rest,
    async decide(input: DecisionInput): Promise<boolean> {
      const answer = await submit({ params: { id: runId }, body: input });
      if (answer === undefined) return false;
      await Promise.all([refreshFlags(), revalidate('runs.view', 'quarters.view', 'sign-off.sheet')]);
      return true;
    },
  };
}
