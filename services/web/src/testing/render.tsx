/** Renders a part or the whole client at an address, as tests need it. */
import { QueryClientProvider } from '@tanstack/react-query';
import { cleanup, configure, render } from '@testing-library/react';
import type { ReactNode } from 'react';
import { I18nProvider } from 'react-aria-components/I18nProvider';
import { createMemoryRouter, RouterProvider } from 'react-router-dom';
import type { RouteObject } from 'react-router-dom';
import { afterEach } from 'vitest';
import { makeQueryClient } from '../lib/query-client.ts';

// A page's module is fetched when it is first visited, which takes its time on a busy machine.
configure({ asyncUtilTimeout: 10_000 });

afterEach(() => cleanup());

/** Routes at an address; the router tells where it led. */
export function renderRoutes(routes: RouteObject[], address: string) {
  const router = createMemoryRouter(routes, { initialEntries: [address] });
  render(
    <I18nProvider locale="en-GB">
      <QueryClientProvider client={makeQueryClient()}>
        <RouterProvider router={router} />
      </QueryClientProvider>
    </I18nProvider>,
  );
  return router;
}

/** One part on a page of its own. */
export function renderPart(part: ReactNode, address = '/') {
  return renderRoutes([{ path: '*', element: part }], address);
}
