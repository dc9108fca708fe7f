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
import { seriesTrials } from './series-trials.ts';
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
  const places = placesOf(run, values);
  const groups = new Map<string, readonly Group[]>(evidence.series.map(({ id }) => [id, values.groups(id)]));
  const comparisons = new Map<string, ComparisonFinding>(
    evidence.comparisons.map((comparison) => [comparison.id, comparisonFinding(run, values, comparison)]),
  );
  const charts = new Map<string, ChartFinding>(
    evidence.charts.map((chart) => [chart.id, chartFinding(run, values, chart, comparisons)]),
  );
  const claims = new Map<string, ClaimFinding>();
  const findings: Findings = {
    version: evidence.version,
    values: new Map(places.flatMap(({ findings }) => [...findings])),
    sources: new Map(places.flatMap(({ sources }) => [...sources])),
    groups,
    comparisons,
    claims,
    charts,
  };
  for (const claim of evidence.claims) claims.set(claim.id, judgeClaim(claim, evidence, findings));
  return findings;
}

/** Findings of one place, and the sources that they name. */
interface PlaceFindings {
  readonly findings: ReadonlyMap<string, Finding>;
  readonly sources: ReadonlyMap<string, Source>;
}

/** Every register quantity outside of all series, then inside those where its value differs. */
function placesOf(run: Evaluation, values: Values): readonly PlaceFindings[] {
  const { quantities, series, models, instruments, comparisons } = run.evidence;
  const outside = new Map(quantities.map(({ id }) => [id, registerFinding(run, values, id, null)]));
  const differing = quantities.filter(({ id }) => variationOf(run, id).differsBySeries).map(({ id }) => id);
  const common = [quantities, models, instruments, comparisons, differing.join(' '), ...outside.values()];
  const inside = series.map((row) =>
    run.node<PlaceFindings>(
      `place@${row.id}`,
      () => [row, seriesTrials(run, row.id), ...common],
      () => withSources(run, values, inSeries(run, values, differing, row.id)),
    ),
  );
  return [withSources(run, values, outside), ...inside];
}

/** What a series gives no value for is left out: there it is neither read nor held. */
function inSeries(
  run: Evaluation,
  values: Values,
  ids: readonly string[],
  series: string,
): Map<string, Finding> {
  const found = new Map<string, Finding>();
  for (const id of ids) {
    const finding = registerFinding(run, values, id, series);
    const isElsewhere = finding.shape === 'fault' && run.register.series.has(finding.at);
    if (!isElsewhere) found.set(quantityKey(id, series), finding);
  }
  return found;
}

function withSources(run: Evaluation, values: Values, findings: ReadonlyMap<string, Finding>): PlaceFindings {
  const sources = new Map<string, Source>();
  const evaluated = freedomInRun(run, values);
  for (const finding of findings.values()) {
    const named =
      finding.shape === 'scalar' ? finding.parts : finding.shape === 'column' ? finding.shared : [];
    for (const { source } of named)
      if (!sources.has(source)) sources.set(source, describeSource(run.register, source, evaluated));
  }
  return { findings, sources };
}
