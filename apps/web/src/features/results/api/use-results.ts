import { usePagedRoute } from '../../../lib/swr';

export const useResults = (runId: string, search: string) =>
  usePagedRoute('runs.results', { id: runId }, { limit: 100, ...(search !== '' && { search }) });
