import type { ImportView } from '@quarterpoise/dto';
import { ErrorState } from '../../../components/error-state';
import { ProblemError } from '../../../lib/problem';

/** Why a file was refused: the service's own words, and what to do. */
export function ImportRefusal({ problem }: { problem: NonNullable<ImportView['problem']> }) {
  return (
    <ErrorState size="inline" problem={new ProblemError({ code: problem.code, status: 422, detail: problem.detail })} />
  );
}
