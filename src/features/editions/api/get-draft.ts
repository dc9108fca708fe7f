import { queryOptions } from '@tanstack/react-query';
import { getReport } from '#shared/contracts/report.ts';
import type { ReportDocument } from '#shared/report/schema/report-node.ts';
import { call } from '#src/lib/api/call.ts';
import type { ProblemAddress } from '#src/lib/problem/problem-address.ts';
import { queryKeys } from '#src/lib/query-keys.ts';

/** The report's text as it is kept now. No event tells of a word that was written, so it is asked for each time. */
export function draftQuery(address: ProblemAddress) {
  return queryOptions({
    queryKey: [...queryKeys.ofProblem(address, 'editions'), 'draft'] as const,
    queryFn: async ({ signal }) => {
      const { document } = await call(getReport, { params: { ...address }, signal });
      return document as ReportDocument;
    },
    staleTime: 0,
  });
}
