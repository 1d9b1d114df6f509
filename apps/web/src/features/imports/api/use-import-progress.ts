import type { ImportProgress, ImportView } from '@quarterpoise/dto';
import { useProgressEvents } from '../../../lib/events';
import { useRevalidate } from '../../../lib/swr';

export const isGoing = (state: ImportView['state']): boolean =>
  state === 'received' || state === 'checking' || state === 'committing';

/** Progress of checking or loading a file; at the end the file and its quarter are read again. */
export function useImportProgress(file: Pick<ImportView, 'id' | 'state'>) {
  const revalidate = useRevalidate();
  return useProgressEvents<ImportProgress>('imports.events', file.id, isGoing(file.state), () => {
    void revalidate('imports.view', 'quarters.view', 'quarters.list', 'plans.list');
  });
}
