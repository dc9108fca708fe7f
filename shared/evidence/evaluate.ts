import { judgeClaim } from '#shared/claims/judge-claim.ts';
import { chartFinding } from './chart-finding.ts';
import { comparisonFinding } from './comparison-finding.ts';
import { fitFreedom, fittedQuantity } from './comparisons.ts';
import type { Evidence } from './evidence.ts';
import { createEvaluationCache, Evaluation, type EvaluationCache } from './evaluation.ts';
import type {
  ChartFinding,
  ClaimFinding,
  ComparisonFinding,
  Finding,
  Findings,
  Group,
  Source,
} from './findings.ts';
import { quantityKey } from './keys.ts';
import { registerFinding } from './register-finding.ts';
import { variationOf } from './register-value.ts';
import { freedomInRun, runValues } from './run-values.ts';
import { describeSource } from './sources.ts';
import { summaryQuantity } from './summary-value.ts';
import type { Values } from './values.ts';

export { createEvaluationCache, type EvaluationCache } from './evaluation.ts';

/**
 * Every number, curve and verdict of a problem. The same evidence gives the same findings, with or without a
 * cache; a cache only saves time.
 *
 * @param evidence - not modified
 * @param cache - of the problem; rows that are the same objects as in the evaluation before are not computed anew
 */
export function evaluate(evidence: Evidence, cache: EvaluationCache = createEvaluationCache()): Findings {
  const run = new Evaluation(evidence, cache, {
    fitted: fittedQuantity,
    summary: summaryQuantity,
    fitFreedom,
  });
  const values = runValues(run);
  const register = registerValues(run, values);
  const groups = new Map<string, readonly Group[]>(evidence.series.map(({ id }) => [id, values.groups(id)]));
  const comparisons = new Map<string, ComparisonFinding>(
    evidence.comparisons.map((comparison) => [comparison.id, comparisonFinding(run, values, comparison)]),
  );
  const charts = new Map<string, ChartFinding>(
    evidence.charts.map((chart) => [chart.id, chartFinding(run, values, chart, comparisons)]),
  );
  const claims = new Map<string, ClaimFinding>();
  const sources = sourcesOf(run, values, register);
  const findings: Findings = {
    version: evidence.version,
    values: register,
    sources,
    groups,
    comparisons,
    claims,
    charts,
  };
  for (const claim of evidence.claims) claims.set(claim.id, judgeClaim(claim, evidence, findings));
  cache.nodes = run.nodes;
  return findings;
}

/** Every register quantity outside of all series, and inside those where its value differs. */
function registerValues(run: Evaluation, values: Values): Map<string, Finding> {
  const found = new Map<string, Finding>();
  for (const { id } of run.evidence.quantities) {
    found.set(id, registerFinding(run, values, id, null));
    if (!variationOf(run, id).differsBySeries) continue;
    for (const { id: series } of run.evidence.series) {
      const inside = registerFinding(run, values, id, series);
      if (inside.shape !== 'fault' || !run.register.series.has(inside.at))
        found.set(quantityKey(id, series), inside);
    }
  }
  return found;
}

/** Every source that a register value names, in words. */
function sourcesOf(
  run: Evaluation,
  values: Values,
  register: ReadonlyMap<string, Finding>,
): Map<string, Source> {
  const sources = new Map<string, Source>();
  const evaluated = freedomInRun(run, values);
  for (const finding of register.values()) {
    const named =
      finding.shape === 'scalar' ? finding.parts : finding.shape === 'column' ? finding.shared : [];
    for (const { source } of named)
      if (!sources.has(source)) sources.set(source, describeSource(run.register, source, evaluated));
  }
  return sources;
}
