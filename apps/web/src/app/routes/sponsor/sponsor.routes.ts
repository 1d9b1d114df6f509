import type { RouteObject } from 'react-router-dom';
import { lazyScreen } from '../../lazy-screen';

/** Screens of administrator, approver and auditor. The service decides what each may do; the screens show what it says. */
export const sponsorRoutes: RouteObject[] = [
  { path: 'plans', ...lazyScreen(() => import('./plans-page'), ['plans', 'quarter']) },
  { path: 'plans/:planId', ...lazyScreen(() => import('./plan-page'), ['plans', 'quarter']) },
  {
    path: 'quarters/:quarterId',
    ...lazyScreen(() => import('./quarter-page'), ['quarter', 'imports', 'run', 'publication']),
  },
  { path: 'quarters/:quarterId/files', ...lazyScreen(() => import('./files-page'), ['quarter', 'imports']) },
  { path: 'quarters/:quarterId/files/:importId', ...lazyScreen(() => import('./file-page'), ['quarter', 'imports']) },
  { path: 'quarters/:quarterId/runs/:runId', ...lazyScreen(() => import('./run-page'), ['quarter', 'run', 'figures']) },
  {
    path: 'quarters/:quarterId/runs/:runId/review',
    ...lazyScreen(() => import('./review-page'), ['quarter', 'review', 'results', 'figures']),
  },
  {
    path: 'quarters/:quarterId/runs/:runId/results',
    ...lazyScreen(() => import('./results-page'), ['quarter', 'review', 'results', 'figures']),
  },
  {
    path: 'quarters/:quarterId/sign-off',
    ...lazyScreen(() => import('./sign-off-page'), ['quarter', 'sign-off', 'results', 'review', 'figures']),
  },
  {
    path: 'quarters/:quarterId/publication',
    ...lazyScreen(() => import('./publication-page'), ['quarter', 'publication']),
  },
];
