import { findValue } from '#shared/evidence/find-value.ts';
import type { Evidence, ValueReference } from '#shared/evidence/evidence.ts';
import type { Fault, Findings, Scalar } from '#shared/evidence/findings.ts';
import type { EvidenceData } from '#src/lib/evidence/evidence-query.ts';
import { sameValue } from './same-value.ts';
import type { RunningEngine } from './start-engine.ts';

/** Evidence and its findings, always of one and the same version. */
export interface FindingsSnapshot {
  readonly evidence: Evidence;
  readonly findings: Findings;
}

/** Findings of one open problem, outside React. */
export interface FindingsStore {
  /** null until the first evaluation has ended. */
  get(): FindingsSnapshot | null;
  /** Why the last evaluation gave nothing; null when it went well. */
  failure(): unknown;
  subscribe(listener: () => void): () => void;
  /** The value of a reference, or why there is none; null before the first findings. */
  find(reference: ValueReference): Scalar | Fault | null;
  /** Hears only when the value of this reference has become another one. */
  subscribeTo(reference: ValueReference, listener: (value: Scalar | Fault | null) => void): () => void;
  /** Takes the newest evidence; evaluations never overlap, and what is overtaken is left out. */
  feed(data: EvidenceData): void;
  close(): void;
}

interface Watch {
  readonly reference: ValueReference;
  readonly listener: (value: Scalar | Fault | null) => void;
  value: Scalar | Fault | null;
}

export function createFindingsStore(start: () => Promise<RunningEngine>): FindingsStore {
  const listeners = new Set<() => void>();
  const watches = new Set<Watch>();
  let snapshot: FindingsSnapshot | null = null;
  let failure: unknown = null;
  let running: Promise<RunningEngine> | null = null;
  let loaded: Evidence | null = null;
  let waiting: EvidenceData | null = null;
  let busy = false;
  let closed = false;

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

  async function evaluateOnce(data: EvidenceData): Promise<void> {
    try {
      running ??= start();
      const { engine } = await running;
      const steps = stepsSince(loaded, data);
      const findings = steps ? await engine.follow(steps) : await engine.load(data.evidence);
      loaded = data.evidence;
      if (!closed) publish({ evidence: data.evidence, findings }, null);
    } catch (error) {
      void running?.then(
        ({ stop }) => stop(),
        () => undefined,
      );
      running = null;
      loaded = null;
      if (!closed) publish(null, error);
    }
  }

  async function work(): Promise<void> {
    if (busy) return;
    busy = true;
    while (waiting && !closed) {
      const data = waiting;
      waiting = null;
      await evaluateOnce(data);
    }
    busy = false;
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
    feed(data) {
      if (data.evidence === (waiting?.evidence ?? loaded)) return;
      waiting = data;
      void work();
    },
    close() {
      closed = true;
      void running?.then(
        ({ stop }) => stop(),
        () => undefined,
      );
    },
  };
}

/** The steps from the evidence that the engine holds to this one; null when it must load the whole. */
function stepsSince(held: Evidence | null, data: EvidenceData) {
  if (!held) return null;
  const missing = data.steps.filter(({ version }) => version > held.version);
  const isWhole = missing.length > 0 && missing.length === data.evidence.version - held.version;
  return isWhole ? missing : null;
}
