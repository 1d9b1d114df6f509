import { useRoute } from '../../../lib/swr';

/** One sign-in per role; an empty list unless the service runs as a demo. */
export const useDemoAccounts = () => useRoute('identity.demo-accounts', {}, { revalidateOnFocus: false });
