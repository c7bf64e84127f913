import { QueryClientProvider } from '@tanstack/react-query';
import { RouterProvider } from 'react-router/dom';
import { UploadsProvider } from '#src/features/upload/uploads.tsx';
import { Toaster } from '#src/ui/toaster.tsx';
import { queryClient } from './query-client.ts';
import { router } from './router.tsx';

export const App = () => (
  <QueryClientProvider client={queryClient}>
    <UploadsProvider>
      <RouterProvider router={router} />
    </UploadsProvider>
    <Toaster />
  </QueryClientProvider>
);
