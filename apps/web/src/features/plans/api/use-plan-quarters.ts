import { useRoute } from '../../../lib/swr';

export const usePlanQuarters = (planId: string) => useRoute('quarters.list', { params: { planId } });
