import { createBrowserRouter, Navigate, type RouteObject } from 'react-router-dom';
import { LoadingState } from '#client/ui/states.tsx';
import { NotFoundPage } from './not-found.tsx';
import { RouteError } from './route-error.tsx';
import { screens } from './screens.ts';
import { Shell } from './shell.tsx';

/** The routes: the shell around every screen, each loaded when it is first opened. */
export function makeRoutes(): RouteObject[] {
  return [{
    element: <Shell />,
    errorElement: <Shell><RouteError /></Shell>,
    children: [{
      errorElement: <RouteError />,
      hydrateFallbackElement: <LoadingState what="the page" />,
      children: [
        { index: true, element: <Navigate to="/search" replace /> },
        ...screens.map((screen): RouteObject => ({
          path: screen.path,
          handle: { instrument: screen.instrument === true },
          lazy: async () => ({ Component: (await screen.load()).Component }),
        })),
        ...(import.meta.env.DEV
          ? [{ path: '/gallery', lazy: async () => ({ Component: (await import('#client/routes/gallery/page.tsx')).Component }) }]
          : []),
        { path: '*', element: <NotFoundPage /> },
      ],
    }],
  }];
}

/** The router of the browser. */
export function makeRouter() {
  return createBrowserRouter(makeRoutes());
}
