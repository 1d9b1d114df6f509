import { useRoute } from '../../../lib/swr';

const GOING_REFRESH_MS = 3_000;

/** A quarter's page. While the service is at work on it (a run, a publication) the answer is read again every few seconds. */
export const useQuarter = (quarterId: string) =>
  useRoute(
    'quarters.view',
    { params: { id: quarterId } },
    {
      refreshInterval: (quarter) => {
        const isPublishing = quarter?.publication != null && quarter.publication.completedAt === null;
        return quarter?.state === 'computing' || isPublishing ? GOING_REFRESH_MS : 0;
      },
    },
  );
