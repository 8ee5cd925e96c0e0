import { QueryClientProvider } from '@tanstack/react-query';
import { lazy, Suspense, useState } from 'react';
import { RouterProvider } from 'react-router-dom';
import { fetchAhead } from './fetch-ahead.ts';
import { createQueryClient } from './query-client.ts';
import { createRouter } from './router.tsx';

/** Nothing to announce before a page stands. */
const ToastRegion = lazy(async () => ({ default: (await import('#client/src/ui/toast.tsx')).ToastRegion }));

/** Before anything is drawn, and once: React may call what it renders twice. */
const client = createQueryClient();
void fetchAhead(client, window.location.pathname);

export function Application() {
  const [router] = useState(createRouter);
  return (
    <QueryClientProvider client={client}>
      <RouterProvider router={router} />
      <Suspense>
        <ToastRegion />
      </Suspense>
    </QueryClientProvider>
  );
}
