import { useRoute } from '../../../lib/swr';

export const usePlan = (planId: string) => useRoute('plans.view', { params: { planId } });
