import { QueryClientProvider } from '@tanstack/react-query';
import { useState } from 'react';
import { I18nProvider } from 'react-aria-components/I18nProvider';
import { RouterProvider } from 'react-router-dom';
import { makeQueryClient } from '../lib/query-client.ts';
import { makeRouter } from './router.tsx';

export function App() {
  const [client] = useState(makeQueryClient);
  const [router] = useState(makeRouter);
  return (
    <I18nProvider locale="en-GB">
      <QueryClientProvider client={client}>
        <RouterProvider router={router} />
      </QueryClientProvider>
    </I18nProvider>
  );
}
