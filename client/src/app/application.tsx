import { QueryClientProvider } from '@tanstack/react-query';
import { lazy, Suspense, useState } from 'react';
import { RouterProvider } from 'react-router-dom';
import { createQueryClient } from './query-client.ts';
import { createRouter } from './router.tsx';

/** Nothing to announce before a page stands. */
const ToastRegion = lazy(async () => ({ default: (await import('#client/src/ui/toast.tsx')).ToastRegion }));

export function Application() {
  const [client] = useState(createQueryClient);
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
