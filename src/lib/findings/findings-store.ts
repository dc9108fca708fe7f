import type { Evidence, ValueReference } from '#shared/evidence/evidence.ts';
import { findValue } from '#shared/evidence/find-value.ts';
import type { Fault, Findings, Scalar } from '#shared/evidence/findings.ts';
import type { Leak } from '#shared/leaks/leak.ts';
import type { ReportDocument } from '#shared/report/schema/report-node.ts';
import type { EvidenceData } from '#src/lib/evidence/evidence-query.ts';
import { createEvaluationQueue, type EvaluationQueue } from './evaluation-queue.ts';
import { sameValue } from './same-value.ts';
import type { RunningEngine } from './start-engine.ts';

/** Evidence and its findings, always of one and the same version. */
export interface FindingsSnapshot {
  readonly evidence: Evidence;
  readonly findings: Findings;
}

type Value = Scalar | Fault | null;

/** Findings of one open problem, outside React. */
export interface FindingsStore {
  /** null until the first evaluation has ended. */
  get(): FindingsSnapshot | null;
  /** Why the last evaluation gave nothing; null when it went well. */
  failure(): unknown;
  subscribe(listener: () => void): () => void;
  /** The value of a reference, or why there is none; null before the first findings. */
  find(reference: ValueReference): Value;
  /** Hears only when the value of this reference has become another one. */
  subscribeTo(reference: ValueReference, listener: (value: Value) => void): () => void;
  /** Where an opponent will press, found beside the page; null before the first findings. */
  leaks(document: ReportDocument): Promise<readonly Leak[] | null>;
  /** Takes the newest evidence, while the store is open. */
  feed(data: EvidenceData): void;
  /** Begins to work; a store may be closed and opened again. */
  open(): void;
  close(): void;
}

interface Watch {
  readonly reference: ValueReference;
  readonly listener: (value: Value) => void;
  value: Value;
}

export function createFindingsStore(start: () => Promise<RunningEngine>): FindingsStore {
  const listeners = new Set<() => void>();
  const watches = new Set<Watch>();
  let snapshot: FindingsSnapshot | null = null;
  let failure: unknown = null;
  let queue: EvaluationQueue | null = null;

  const find = (reference: ValueReference) =>
    snapshot ? findValue(snapshot.findings, snapshot.evidence, reference) : null;

  function publish(next: FindingsSnapshot | null, reason: unknown): void {
    snapshot = next ?? snapshot;
    failure = reason;
    for (const listener of [...listeners]) listener();
    for (const watch of [...watches]) {
      const value = find(watch.reference);
      if (sameValue(watch.value, value)) continue;
      watch.value = value;
      watch.listener(value);
    }
  }

  return {
    get: () => snapshot,
    failure: () => failure,
    subscribe(listener) {
      listeners.add(listener);
      return () => listeners.delete(listener);
    },
    find,
    subscribeTo(reference, listener) {
      const watch: Watch = { reference, listener, value: find(reference) };
      watches.add(watch);
      return () => watches.delete(watch);
    },
    leaks: (document) => queue?.leaks(document) ?? Promise.resolve(null),
    feed: (data) => queue?.feed(data),
    open() {
      queue ??= createEvaluationQueue(start, {
        done: (evidence, findings) => publish({ evidence, findings }, null),
        failed: (reason) => publish(null, reason),
      });
    },
    close() {
      queue?.stop();
      queue = null;
    },
  };
}
