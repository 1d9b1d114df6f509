import { Suspense } from 'react';
import { createBrowserRouter, Outlet, type RouteObject } from 'react-router-dom';
import { LoadingPage } from '../components/loading';
import { RouteError } from '../components/route-error';
import { SessionProvider } from '../lib/session';
import { Home } from './home';
import { lazyScreen } from './lazy-screen';
import { NotFoundPage } from './not-found';
import { operatorRoutes } from './routes/operator/operator.routes';
import { participantRoutes } from './routes/participant/participant.routes';
import { sponsorRoutes } from './routes/sponsor/sponsor.routes';
import { supportRoutes } from './routes/support/support.routes';
import { SignedIn } from './signed-in';

function Root() {
  return (
    <SessionProvider>
      <Suspense fallback={<LoadingPage />}>
        <Outlet />
      </Suspense>
    </SessionProvider>
  );
}

export const routes: RouteObject[] = [
  {
    element: <Root />,
    hydrateFallbackElement: <LoadingPage />,
    errorElement: <RouteError />,
    children: [
      { path: 'sign-in', ...lazyScreen(() => import('./routes/sign-in-page'), ['sign-in']) },
      {
        element: <SignedIn />,
        children: [
          {
            errorElement: <RouteError />,
            children: [
              { index: true, element: <Home /> },
              ...sponsorRoutes,
              ...participantRoutes,
              ...supportRoutes,
              ...operatorRoutes,
              { path: '*', element: <NotFoundPage /> },
            ],
          },
        ],
      },
    ],
  },
];

export const createRouter = () => createBrowserRouter(routes);
