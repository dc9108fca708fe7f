import { useSyncExternalStore } from 'react';
import type { Evidence } from '#shared/evidence/evidence.ts';
import type { Findings } from '#shared/evidence/findings.ts';
import type { FindingsSnapshot } from '#src/lib/findings/findings-store.ts';
import { useProblem } from '#src/lib/problem/problem-context.ts';

/** Evidence and its findings, always of one and the same version. */
export function useFindingsSnapshot(): FindingsSnapshot {
  const { store } = useProblem();
  const snapshot = useSyncExternalStore(store.subscribe, store.get);
  if (!snapshot)
    throw new Error('useFindingsSnapshot: the frame shows a screen only once there are findings');
  return snapshot;
}

/** What the team entered for the open problem, of the version that the findings have. */
export function useEvidence(): Evidence {
  return useFindingsSnapshot().evidence;
}

/** Every number, curve and verdict of the open problem. */
export function useFindings(): Findings {
  return useFindingsSnapshot().findings;
}
