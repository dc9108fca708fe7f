import { QueryClient } from '@tanstack/react-query';
import { ApiError } from './api/api-error.ts';

/** Only a call that never reached the server is worth repeating by itself. */
function isWorthRepeating(failures: number, error: unknown): boolean {
  return error instanceof ApiError && error.status === 0 && failures < 2;
}

export function createQueryClient(): QueryClient {
  return new QueryClient({
    defaultOptions: {
      queries: { staleTime: 30_000, retry: isWorthRepeating, networkMode: 'always' },
      mutations: { retry: false, networkMode: 'always' },
    },
  });
}
