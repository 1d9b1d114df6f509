import type { RouteObject } from 'react-router-dom';
import { lazyScreen } from '../../lazy-screen';

export const operatorRoutes: RouteObject[] = [
  { path: 'operations', ...lazyScreen(() => import('./operations-page'), ['operations']) },
];
