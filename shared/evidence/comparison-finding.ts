import { standardUncertainty } from '#shared/uncertainty/standard-uncertainty.ts';
import type { ComparisonData } from './comparison-data.ts';
import { comparisonPoints } from './comparison-points.ts';
import { comparisonSentence } from './comparison-sentence.ts';
import { comparisonWarnings } from './comparison-warnings.ts';
import type { SolvedFit } from './comparison-fit.ts';
import {
  comparisonDeps,
  foundParameters,
  selectedSeries,
  solvedComparison,
  type SolvedComparison,
  type UnsolvedComparison,
} from './comparisons.ts';
import { comparisonInputs } from './dependencies.ts';
import type { Evaluation } from './evaluation.ts';
import type { Comparison } from './evidence.ts';
import type { ComparisonFinding, ComparisonPoint, FittedParameter } from './findings.ts';
import { seriesGroups } from './groups.ts';
import type { Values } from './values.ts';

/** A comparison as it is shown; the same object while nothing it rests on has changed. */
export function comparisonFinding(
  run: Evaluation,
  values: Values,
  comparison: Comparison,
): ComparisonFinding {
  const solved = solvedComparison(run, comparison);
  return run.node<ComparisonFinding>(
    `comparison:${comparison.id}`,
    () => {
      const series = selectedSeries(run, comparison);
      return [
        solved,
        run.evidence.settings,
        ...comparisonDeps(run, comparison),
        ...series.map((id) => run.register.series.get(id)),
        ...series.map((id) => seriesGroups(run, id)),
        ...fitsUsed(run, comparison).map(([, used]) => used),
      ];
    },
    () =>
      'fault' in solved
        ? unsolvedFinding(values, comparison, solved)
        : solvedFinding(run, values, comparison, solved),
  );
}

/** Fits of other comparisons that give this one a constant, with what they gave. */
function fitsUsed(
  run: Evaluation,
  comparison: Comparison,
): readonly [string, SolvedComparison | UnsolvedComparison][] {
  const fits = new Map<string, SolvedComparison | UnsolvedComparison>();
  for (const leaf of comparisonInputs(run.register, comparison).leaves) {
    const def = leaf.kind === 'quantity' ? run.register.quantities.get(leaf.id)?.def : undefined;
    const other = def?.origin === 'fitted' ? run.register.comparisons.get(def.comparison) : undefined;
    if (other !== undefined && other.id !== comparison.id) fits.set(other.id, solvedComparison(run, other));
  }
  return [...fits];
}

/** What is known of a comparison that could not be solved: its trials, and what they measured. */
function unsolvedFinding(
  values: Values,
  { id }: Comparison,
  { fault, outside, data }: UnsolvedComparison,
): ComparisonFinding {
  return {
    id,
    status: 'fault',
    fault,
    parameters: [],
    covariance: null,
    chiSquared: null,
    degreesOfFreedom: null,
    pValue: null,
    aicc: null,
    worstZ: null,
    used: data?.used.map((pick) => pick.id) ?? [],
    outside,
    points: data === null ? [] : measuredOnly(values, data),
    warnings: [],
    sentence: fault.sentence,
  };
}

function measuredOnly(values: Values, data: ComparisonData): readonly ComparisonPoint[] {
  const points = comparisonPoints({ values, data, parameters: new Map(), fits: new Map() });
  return points.map((point) => ({ ...point, predicted: null, difference: null, z: null, fittedTo: false }));
}

function solvedFinding(
  run: Evaluation,
  values: Values,
  comparison: Comparison,
  solved: SolvedComparison,
): ComparisonFinding {
  const { data, fit, goodness } = solved;
  const trialsOf = ({ used }: typeof data): ReadonlySet<string> => new Set(used.map(({ id }) => id));
  const fits = new Map<string, ReadonlySet<string>>();
  for (const [id, other] of fitsUsed(run, comparison))
    if (other.data !== null) fits.set(id, trialsOf(other.data));
  if (fit !== null) fits.set(comparison.id, trialsOf(data));
  const points = comparisonPoints({ values, data, parameters: foundParameters(fit), fits });
  const zs = points.filter(({ trusted }) => trusted).map(({ z }) => (z === null ? 0 : Math.abs(z)));
  const worst = points.some(({ z, trusted }) => trusted && z !== null) ? Math.max(...zs) : null;
  const finding = {
    id: comparison.id,
    status: fit === null ? ('predicted' as const) : ('fitted' as const),
    parameters: fittedParameters(fit),
    covariance: fit?.covariance ?? null,
    chiSquared: goodness.chiSquared,
    degreesOfFreedom: goodness.degreesOfFreedom,
    pValue: goodness.pValue,
    aicc: goodness.aicc,
    worstZ: worst,
    used: data.used.map(({ id }) => id),
    outside: data.outside,
    points,
  };
  const context = { register: run.register, comparison, data, fit, goodness };
  return {
    ...finding,
    warnings: comparisonWarnings(context),
    sentence: comparisonSentence(context, finding),
  };
}

function fittedParameters(fit: SolvedFit | null): readonly FittedParameter[] {
  return (fit?.parameters ?? []).map(({ quantity, value, fitParts, sharedParts, atBound }) => ({
    quantity,
    value,
    uFit: standardUncertainty(fitParts),
    uShared: standardUncertainty(sharedParts),
    u: standardUncertainty([...fitParts, ...sharedParts]),
    atBound,
  }));
}
