import { StrictMode } from 'react';
import { createRoot } from 'react-dom/client';
import { createQueryClient } from '#src/lib/query-client.ts';
import { createRouter } from '#src/router.tsx';
import { Providers } from './providers.tsx';

export function mount(): void {
  const root = document.getElementById('root');
  if (!root) throw new Error('mount: the page has no element with the id root');
  createRoot(root).render(
    <StrictMode>
      <Providers client={createQueryClient()} router={createRouter()} />
    </StrictMode>,
  );
}
