/** Renders a part or the whole client at an address, as tests need it. */
import { QueryClientProvider } from '@tanstack/react-query';
import { cleanup, render } from '@testing-library/react';
import type { ReactNode } from 'react';
import { I18nProvider } from 'react-aria-components/I18nProvider';
import { createMemoryRouter, RouterProvider } from 'react-router-dom';
import type { RouteObject } from 'react-router-dom';
import { afterEach } from 'vitest';
import { makeQueryClient } from '../lib/query-client.ts';

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
