import type { Evidence } from '#shared/evidence/evidence.ts';
import type { Findings } from '#shared/evidence/findings.ts';
import type { Leak } from '#shared/leaks/leak.ts';
import type { ReportDocument } from '#shared/report/schema/report-node.ts';
import type { EvidenceData } from '#src/lib/evidence/evidence-query.ts';
import type { RunningEngine } from './start-engine.ts';

export interface EvaluationQueue {
  /** Takes the newest evidence. Evaluations never overlap, and what is overtaken is left out. */
  feed(data: EvidenceData): void;
  /** Leaks of what was evaluated last; null while nothing was. */
  leaks(document: ReportDocument): Promise<readonly Leak[] | null>;
  /** Stops the engine; nothing more is published. */
  stop(): void;
}

interface Outcome {
  done(evidence: Evidence, findings: Findings): void;
  failed(reason: unknown): void;
}

/** Feeds one engine: whole evidence first and after a failure, otherwise only the steps that are new to it. */
export function createEvaluationQueue(
  start: () => Promise<RunningEngine>,
  outcome: Outcome,
): EvaluationQueue {
  let running: Promise<RunningEngine> | null = null;
  let held: Evidence | null = null;
  let waiting: EvidenceData | null = null;
  let isBusy = false;
  let isStopped = false;

  function stopEngine(): void {
    void running?.then(
      ({ stop }) => stop(),
      () => undefined,
    );
    running = null;
    held = null;
  }

  async function evaluateOnce(data: EvidenceData): Promise<void> {
    try {
      running ??= start();
      const { engine } = await running;
      const steps = stepsSince(held, data);
      const findings = steps ? await engine.follow(steps) : await engine.load(data.evidence);
      if (isStopped) return;
      held = data.evidence;
      outcome.done(data.evidence, findings);
    } catch (error) {
      stopEngine();
      if (!isStopped) outcome.failed(error);
    }
  }

  async function work(): Promise<void> {
    if (isBusy) return;
    isBusy = true;
    while (waiting && !isStopped) {
      const data = waiting;
      waiting = null;
      await evaluateOnce(data);
    }
    isBusy = false;
  }

  return {
    feed(data) {
      if (data.evidence === (waiting?.evidence ?? held)) return;
      waiting = data;
      void work();
    },
    async leaks(document) {
      if (!running || !held) return null;
      const { engine } = await running;
      return engine.leaks(document);
    },
    stop() {
      isStopped = true;
      stopEngine();
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
