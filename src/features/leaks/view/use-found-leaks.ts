import { useEffect, useState } from 'react';
import type { Leak } from '#shared/leaks/leak.ts';
import type { ReportDocument } from '#shared/report/schema/report-node.ts';
import { useFindingsSnapshot } from '#src/lib/evidence/use-evidence.ts';
import { useProblem } from '#src/lib/problem/problem-context.ts';

interface Found {
  readonly leaks: readonly Leak[] | null;
  /** Why the last search gave nothing; null when it went well. */
  readonly failure: unknown;
}

/** Leaks of the newest evidence and this text, found in the worker; the last ones stay until the next are there. */
export function useFoundLeaks(document: ReportDocument | undefined): Found {
  const { store } = useProblem();
  const snapshot = useFindingsSnapshot();
  const [found, setFound] = useState<Found>({ leaks: null, failure: null });
  useEffect(() => {
    if (!document) return undefined;
    let isCurrent = true;
    store.leaks(document).then(
      (leaks) => {
        if (isCurrent && leaks) setFound({ leaks, failure: null });
      },
      (failure: unknown) => {
        if (isCurrent) setFound(({ leaks }) => ({ leaks, failure }));
      },
    );
    return () => {
      isCurrent = false;
    };
  }, [store, snapshot, document]);
  return found;
}
