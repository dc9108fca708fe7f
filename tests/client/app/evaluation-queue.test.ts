import { expect, test, vi } from 'vitest';
import type { EvidenceStep } from '#shared/contracts/evidence-changes.ts';
import type { Evidence } from '#shared/evidence/evidence.ts';
import type { Findings } from '#shared/evidence/findings.ts';
import type { EvidenceData } from '#src/lib/evidence/evidence-query.ts';
import { createEvaluationQueue } from '#src/lib/findings/evaluation-queue.ts';
import { emptyEvidence } from '../support/invented.ts';

function findingsOf(version: number): Findings {
  const none = new Map<string, never>();
  return {
    version,
    values: none,
    sources: none,
    groups: none,
    comparisons: none,
    claims: none,
    charts: none,
  };
}

function step(version: number): EvidenceStep {
  return { version, mutationId: `m-${version}`, changes: [] };
}

function data(version: number, steps: readonly number[] = []): EvidenceData {
  return { evidence: emptyEvidence({ version }), rowVersions: {}, steps: steps.map(step) };
}

/** An engine whose evaluations end when the test says so, in the order in which they were asked for. */
function heldEngine() {
  const calls: string[] = [];
  const ends: (() => void)[] = [];
  const wait = (version: number) =>
    new Promise<Findings>((resolve) => ends.push(() => resolve(findingsOf(version))));
  return {
    calls,
    stopped: vi.fn(),
    async endNext() {
      await vi.waitFor(() => expect(ends.length).toBeGreaterThan(0));
      ends.shift()?.();
    },
    load(evidence: Evidence) {
      calls.push(`load ${evidence.version}`);
      return wait(evidence.version);
    },
    follow(steps: readonly EvidenceStep[]) {
      calls.push(`follow ${steps.map(({ version }) => version).join(' ')}`);
      return wait(steps.at(-1)?.version ?? 0);
    },
    leaks: () => [],
  };
}

function queueOf(engine: ReturnType<typeof heldEngine>) {
  const versions: number[] = [];
  const failures: unknown[] = [];
  const queue = createEvaluationQueue(() => Promise.resolve({ engine, stop: engine.stopped }), {
    done: (_, findings) => versions.push(findings.version),
    failed: (reason) => failures.push(reason),
  });
  return { queue, versions, failures };
}

test('evaluation queue, when a step follows: the engine is given the step alone', async () => {
  const engine = heldEngine();
  const { queue, versions } = queueOf(engine);

  queue.feed(data(1));
  await engine.endNext();
  await vi.waitFor(() => expect(versions).toEqual([1]));
  queue.feed(data(2, [2]));
  await engine.endNext();

  await vi.waitFor(() => expect(versions).toEqual([1, 2]));
  expect(engine.calls).toEqual(['load 1', 'follow 2']);
});

test('evaluation queue, when evidence is overtaken while one runs: what lies between is followed at once', async () => {
  const engine = heldEngine();
  const { queue, versions } = queueOf(engine);

  queue.feed(data(1));
  await vi.waitFor(() => expect(engine.calls).toHaveLength(1));
  queue.feed(data(2, [2]));
  queue.feed(data(3, [2, 3]));
  await engine.endNext();
  await engine.endNext();

  await vi.waitFor(() => expect(versions).toEqual([1, 3]));
  expect(engine.calls).toEqual(['load 1', 'follow 2 3']);
});

test('evaluation queue, when steps are missing: the whole evidence is loaded', async () => {
  const engine = heldEngine();
  const { queue, versions } = queueOf(engine);

  queue.feed(data(1));
  await engine.endNext();
  await vi.waitFor(() => expect(versions).toEqual([1]));
  queue.feed(data(5, [5]));
  await engine.endNext();

  await vi.waitFor(() => expect(versions).toEqual([1, 5]));
  expect(engine.calls).toEqual(['load 1', 'load 5']);
});

test('evaluation queue, when an evaluation fails: says why, and begins afresh with the next evidence', async () => {
  const engine = heldEngine();
  const { queue, versions, failures } = queueOf(engine);
  const reason = new Error('out of memory');
  vi.spyOn(engine, 'load').mockRejectedValueOnce(reason);

  queue.feed(data(1));
  await vi.waitFor(() => expect(failures).toEqual([reason]));
  queue.feed(data(2, [2]));
  await engine.endNext();

  await vi.waitFor(() => expect(versions).toEqual([2]));
  expect(engine.stopped).toHaveBeenCalledTimes(1);
});

test('evaluation queue, when it is stopped during an evaluation: nothing more is published', async () => {
  const engine = heldEngine();
  const { queue, versions } = queueOf(engine);

  queue.feed(data(1));
  await vi.waitFor(() => expect(engine.calls).toHaveLength(1));
  queue.stop();
  await engine.endNext();
  await new Promise((resolve) => setTimeout(resolve, 10));

  expect(versions).toEqual([]);
  expect(engine.stopped).toHaveBeenCalledTimes(1);
});
