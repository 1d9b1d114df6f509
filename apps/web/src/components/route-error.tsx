import { useRouteError } from 'react-router-dom';
import { asProblem, ProblemError } from '../lib/problem';
import { ErrorState } from './error-state';

/** The router's safety net: a screen that failed to load (after a new release its file may be gone) or broke while drawing. */
export function RouteError() {
  const error = useRouteError();
  const isScreenMissing =
    error instanceof TypeError && /dynamically imported module|module script/i.test(error.message);
  const problem = isScreenMissing ? new ProblemError({ code: 'unreachable', status: 0 }) : asProblem(error);
  return <ErrorState problem={problem} onRetry={() => window.location.reload()} />;
}
