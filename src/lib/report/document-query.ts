import { queryOptions } from '@tanstack/react-query';
import { getReport } from '#shared/contracts/report.ts';
import type { ReportDocument } from '#shared/report/schema/report-node.ts';
import { call } from '#src/lib/api/call.ts';
import type { ProblemAddress } from '#src/lib/problem/problem-address.ts';
import { queryKeys } from '#src/lib/query-keys.ts';

/** The report's text as it is kept; asked for again when an event tells that it was written on. */
export function documentQuery(address: ProblemAddress) {
  return queryOptions({
    queryKey: queryKeys.report(address),
    queryFn: async ({ signal }) => {
      const { document } = await call(getReport, { params: { ...address }, signal });
      return document as ReportDocument;
    },
    staleTime: 0,
  });
}
