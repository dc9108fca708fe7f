import { useQuery } from '@tanstack/react-query';
import { useEffect, useState } from 'react';
import { getReport } from '#shared/contracts/report.ts';
import { call } from '#src/lib/api/call.ts';
import { useProblem } from '#src/lib/problem/problem-context.ts';
import { openReportSession, type ReportSession } from './report-session.ts';

/** The co-editing of the open problem's report; null while its lineage is asked for. */
export function useReportSession(): {
  session: ReportSession | null;
  error: Error | null;
  retry: () => void;
} {
  const { address } = useProblem();
  const { data, error, refetch } = useQuery({
    queryKey: ['report lineage', address.team, address.number],
    queryFn: ({ signal }) => call(getReport, { params: { ...address }, signal }),
    staleTime: Infinity,
  });
  const lineage = data?.lineage;
  const [session, setSession] = useState<ReportSession | null>(null);
  useEffect(() => {
    if (lineage === undefined) return undefined;
    const opened = openReportSession(address, lineage);
    let isWanted = true;
    // Told like any other news of it, so that opening and closing follow one another also when effects run twice.
    queueMicrotask(() => isWanted && setSession(opened));
    return () => {
      isWanted = false;
      setSession(null);
      opened.close();
    };
  }, [address, lineage]);
  return { session, error, retry: () => void refetch() };
}
