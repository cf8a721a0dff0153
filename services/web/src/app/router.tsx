/** Addresses to pages: each lazy, each with its own error page inside the frame. */
import { createBrowserRouter } from 'react-router-dom';
import type { RouteObject } from 'react-router-dom';
import { Frame } from './frame.tsx';
import { Gate } from './gate.tsx';
import { NotFoundPage } from './not-found-page.tsx';
import { PageError } from './page-error.tsx';
import { pages } from './pages.tsx';
import type { PageEntry } from './pages.tsx';
import { Start } from './start.tsx';
import { Loading } from '../ui/loading.tsx';

export const routes: RouteObject[] = [
  {
    element: <Frame />,
    errorElement: <PageError />,
    hydrateFallbackElement: <Loading>Opening Cairnstep.</Loading>,
    children: [
      ...pages.map(routeOf),
      { path: '/start', element: <Start />, errorElement: <PageError /> },
      { path: '*', element: <NotFoundPage />, errorElement: <PageError /> },
    ],
  },
];

export const makeRouter = () => createBrowserRouter(routes);

function routeOf({ path, audience, load }: PageEntry): RouteObject {
  return {
    path,
    errorElement: <PageError />,
    lazy: async () => {
      const { default: Page } = await load();
      return {
        element: (
          <Gate audience={audience}>
            <Page />
          </Gate>
        ),
      };
    },
  };
}
