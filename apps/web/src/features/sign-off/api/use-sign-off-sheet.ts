import { useRoute } from '../../../lib/swr';

/** null as long as there is no run to sign. */
export const useSignOffSheet = (quarterId: string | null) =>
  useRoute('sign-off.sheet', quarterId === null ? null : { params: { id: quarterId } });
