import { usePagedRoute } from '../../../lib/swr';

export interface FlagFilter {
  undecided: boolean;
  code: string | null;
}

/** Flags of a run, worst first; the order is the service's. */
export const useFlags = (runId: string, filter: FlagFilter) =>
  usePagedRoute(
    'review.flags',
    { id: runId },
    { limit: 100, ...(filter.undecided && { undecided: 'true' }), ...(filter.code !== null && { code: filter.code }) },
  );
