import { queryOptions, type QueryClient } from '@tanstack/react-query';
import type { EvidenceStep } from '#shared/contracts/evidence-changes.ts';
import { getEvidence } from '#shared/contracts/evidence.ts';
import { applyStep } from '#shared/evidence/apply-change.ts';
import type { Evidence } from '#shared/evidence/evidence.ts';
import { call } from '#src/lib/api/call.ts';
import type { ProblemAddress } from '#src/lib/problem/problem-address.ts';
import { queryKeys } from '#src/lib/query-keys.ts';

/** How many of the last steps are kept beside the evidence, so that the findings worker can follow them. */
const KEPT_STEPS = 32;

export interface EvidenceData {
  readonly evidence: Evidence;
  /** Version of each definition's row, for If-Match. */
  readonly rowVersions: Readonly<Record<string, number>>;
  /** The steps that led here since the last whole fetch, newest last. */
  readonly steps: readonly EvidenceStep[];
}

export function evidenceQuery(client: QueryClient, address: ProblemAddress) {
  const queryKey = queryKeys.evidence(address);
  return queryOptions({
    queryKey,
    staleTime: Infinity,
    queryFn: async ({ signal }): Promise<EvidenceData> => {
      const fetched = await call(getEvidence, { params: { ...address }, signal });
      const present = client.getQueryData<EvidenceData>(queryKey);
      // Steps may have arrived while the fetch was on its way: what is newer stays.
      if (present && present.evidence.version > fetched.evidence.version) return present;
      return { ...fetched, steps: [] };
    },
  });
}

/**
 * Applies one step to the cached evidence. 'old': already contained. 'gap': steps are missing, so the evidence is
 * being fetched again.
 */
export function takeStep(
  client: QueryClient,
  address: ProblemAddress,
  step: EvidenceStep,
): 'applied' | 'old' | 'gap' | 'not open' {
  const queryKey = queryKeys.evidence(address);
  const present = client.getQueryData<EvidenceData>(queryKey);
  if (!present) return 'not open';
  if (step.version <= present.evidence.version) return 'old';
  if (step.version > present.evidence.version + 1) {
    void client.invalidateQueries({ queryKey, exact: true }, { cancelRefetch: true });
    return 'gap';
  }
  client.setQueryData<EvidenceData>(queryKey, {
    evidence: applyStep(present.evidence, step.changes, step.version),
    rowVersions: nextRowVersions(present.rowVersions, step),
    steps: [...present.steps, step].slice(-KEPT_STEPS),
  });
  return 'applied';
}

/** Every replacement of a row raises its version by one; a removed row has none. */
function nextRowVersions(
  versions: Readonly<Record<string, number>>,
  step: EvidenceStep,
): Readonly<Record<string, number>> {
  const next: Record<string, number> = { ...versions };
  for (const change of step.changes) {
    if (change.table === 'settings' || change.table === 'trials') continue;
    if (change.row === null) delete next[change.id];
    else next[change.id] = (versions[change.id] ?? 0) + 1;
  }
  return next;
}
