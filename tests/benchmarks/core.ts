/** How long a problem's evidence takes to become findings, from nothing and after one cell was corrected. */
import { applyStep } from '#shared/evidence/apply-change.ts';
import { createEvaluationCache, evaluate } from '#shared/evidence/evaluate.ts';
import type { Evidence } from '#shared/evidence/evidence.ts';
import { largeEvidence } from './large-evidence.ts';
import type { Figure } from './run.ts';

const FROM_NOTHING_MS = 1000;
const ONE_CELL_MS = 50;
const RUNS = 5;
const EDITS = 15;

/** Median of each figure, the first run, which compiles, left out. */
export async function benchmarks(): Promise<Figure[]> {
  evaluate(largeEvidence());
  const whole = median(
    Array.from({ length: RUNS }, () => milliseconds(largeEvidence(), (evidence) => void evaluate(evidence))),
  );
  const cell = median(oneCellEdits());
  return [
    {
      name: '10 000 trials from nothing',
      value: whole,
      reach: FROM_NOTHING_MS,
      unit: 'ms',
      ok: whole <= FROM_NOTHING_MS,
    },
    { name: 'after a one-cell edit', value: cell, reach: ONE_CELL_MS, unit: 'ms', ok: cell <= ONE_CELL_MS },
  ];
}

function oneCellEdits(): number[] {
  const cache = createEvaluationCache();
  let evidence = largeEvidence();
  evaluate(evidence, cache);
  return Array.from({ length: EDITS + 1 }, (_, i) => {
    const trial = evidence.trials[503 * (i + 1)];
    if (trial === undefined) return NaN;
    const row = {
      ...structuredClone(trial),
      values: { ...trial.values, [`r${i % 10}`]: { text: `${60 + i}.25`, unit: 'cm' } },
    };
    const before = evidence;
    return milliseconds(before, () => {
      evidence = applyStep(before, [{ table: 'trials', id: row.id, row }], before.version + 1);
      evaluate(evidence, cache);
    });
  }).slice(1);
}

function milliseconds(evidence: Evidence, work: (evidence: Evidence) => void): number {
  const start = performance.now();
  work(evidence);
  return performance.now() - start;
}

function median(values: readonly number[]): number {
  const sorted = [...values].sort((a, b) => a - b);
  return sorted[Math.floor(sorted.length / 2)] ?? NaN;
}
