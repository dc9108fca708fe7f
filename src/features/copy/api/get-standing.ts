import { queryOptions } from '@tanstack/react-query';
import { getCopyStanding } from '#shared/contracts/copies.ts';
import { ApiError } from '#src/lib/api/api-error.ts';
import { call } from '#src/lib/api/call.ts';
import { copyKeys } from './keys.ts';

const EVERY_MS = 15_000;

/** Whether the copy is still open: asked now and then while it is read. `null`: it is not. */
export const standingQuery = (token: string) =>
  queryOptions({
    queryKey: copyKeys.standing(token),
    queryFn: async ({ signal }) => {
      try {
        return await call(getCopyStanding, { params: { token }, signal, mayBeSignedOut: true });
      } catch (error) {
        if (error instanceof ApiError && error.status === 404) return null;
        throw error;
      }
    },
    refetchInterval: ({ state }) => (state.data === null ? false : EVERY_MS),
    refetchOnWindowFocus: 'always',
    staleTime: 0,
    gcTime: 0,
    retry: false,
  });
