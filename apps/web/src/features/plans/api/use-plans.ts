import { useRoute } from '../../../lib/swr';

/** The plans in one's care, most pressing first; the order is the service's. */
export const usePlans = () => useRoute('plans.list', {});
