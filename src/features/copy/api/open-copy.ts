import { queryOptions } from '@tanstack/react-query';
import { openCopy } from '#shared/contracts/copies.ts';
import { call } from '#src/lib/api/call.ts';
import { copyKeys } from './keys.ts';

/** A lent copy. It never changes while it is open, and opening it is logged: it is asked for once. */
export const copyQuery = (token: string) =>
  queryOptions({
    queryKey: copyKeys.copy(token),
    queryFn: ({ signal }) => call(openCopy, { params: { token }, signal, mayBeSignedOut: true }),
    staleTime: Infinity,
    gcTime: 0,
    retry: false,
  });
