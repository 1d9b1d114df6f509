import { usePagedRoute } from '../../../lib/swr';

/** Files of a plan for one quarter, newest first. */
export const useImports = (planId: string, quarterId: string) =>
  usePagedRoute('imports.list', { planId }, { quarterId, limit: 50 });
