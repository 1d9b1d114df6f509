import { useRevalidate } from '../../../lib/swr';
import { useSubmit } from '../../../lib/use-submit';

/** Loads a previewed file, or puts it away; both read the file and its quarter again. */
export function useSettleImport(importId: string) {
  const commit = useSubmit('imports.commit');
  const discard = useSubmit('imports.discard');
  const revalidate = useRevalidate();
  const settle = (write: typeof commit | typeof discard) => async (): Promise<boolean> => {
    const answer = await write.submit({ params: { id: importId } });
    await revalidate('imports.view', 'quarters.view', 'quarters.list', 'plans.list');
    return answer !== undefined;
  };
  return { commit: { ...commit, run: settle(commit) }, discard: { ...discard, run: settle(discard) } };
}
