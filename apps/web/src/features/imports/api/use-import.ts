import { useRoute } from '../../../lib/swr';

export const useImport = (importId: string) => useRoute('imports.view', { params: { id: importId } });
