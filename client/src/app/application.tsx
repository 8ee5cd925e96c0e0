import { QueryClientProvider } from '@tanstack/react-query';
import { useState } from 'react';
import { RouterProvider } from 'react-router-dom';
import { ToastRegion } from '#client/src/ui/toast.tsx';
import { createQueryClient } from './query-client.ts';
import { createRouter } from './router.tsx';

export function Application() {
  const [client] = useState(createQueryClient);
  const [router] = useState(createRouter);
  return (
    <QueryClientProvider client={client}>
      <RouterProvider router={router} />
      <ToastRegion />
    </QueryClientProvider>
  );
}
