import { queryOptions } from '@tanstack/react-query';
import { getHealth } from '#src/lib/api/boot-endpoints.ts';
import { call } from '#src/lib/api/call.ts';
import { queryKeys } from '#src/lib/query-keys.ts';

export const healthQuery = queryOptions({
  queryKey: queryKeys.health,
  queryFn: ({ signal }) => call(getHealth, { signal, mayBeSignedOut: true }),
});
