import { useRoute } from '../../../lib/swr';

export const useRun = (runId: string) => useRoute('runs.view', { params: { id: runId } });
