import { QueryClientProvider, type QueryClient } from '@tanstack/react-query';
import type { ComponentProps } from 'react';
import { RouterProvider } from 'react-router-dom';

interface ProvidersProps {
  readonly client: QueryClient;
  readonly router: ComponentProps<typeof RouterProvider>['router'];
}

export function Providers({ client, router }: ProvidersProps) {
  return (
    <QueryClientProvider client={client}>
      <RouterProvider router={router} />
    </QueryClientProvider>
  );
}
