import type { Evidence } from '#shared/evidence/evidence.ts';
import { findValue } from '#shared/evidence/find-value.ts';
import type { Findings } from '#shared/evidence/findings.ts';
import type { FindingsStore } from './findings-store.ts';

/** Findings of an edition: there from the start, never evaluated, never another. */
export function createFrozenFindings(evidence: Evidence, findings: Findings): FindingsStore {
  const snapshot = { evidence, findings };
  const nothing = () => undefined;
  return {
    get: () => snapshot,
    failure: () => null,
    // Leaks are the team's own business and never in a copy.
    leaks: () => Promise.resolve(null),
    subscribe: () => nothing,
    find: (reference) => findValue(findings, evidence, reference),
    subscribeTo: () => nothing,
    feed: nothing,
    open: nothing,
    close: nothing,
  };
}
