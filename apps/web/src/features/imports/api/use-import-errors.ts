import { usePagedRoute } from '../../../lib/swr';

export const useImportErrors = (importId: string) => usePagedRoute('imports.errors', { id: importId }, { limit: 100 });
