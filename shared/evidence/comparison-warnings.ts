import { at } from '#shared/numeric/element.ts';
import { runsTest } from '#shared/statistics/runs-test.ts';
import { formatValue } from '#shared/formatting/format-scalar.ts';
import type { ComparisonData } from './comparison-data.ts';
import type { Goodness, SolvedFit } from './comparison-fit.ts';
import type { Comparison } from './evidence.ts';
import { symbolName, type Register } from './register.ts';
import { rowOf } from './uncertain.ts';
import { counted, listInWords } from './words.ts';

/** A solved comparison, for what is said of it. */
export interface SolvedContext {
  readonly register: Register;
  readonly comparison: Comparison;
  readonly data: ComparisonData;
  readonly fit: SolvedFit | null;
  readonly goodness: Goodness;
}

/** Above it parameters are hard to tell apart: digits are lost by about its logarithm. */
const POOR_CONDITION = 1e8;

/** p-values outside of these ask for a word. */
const [LOW_P, HIGH_P] = [0.01, 0.99];

/** What a careful referee would say of a comparison, one sentence each. */
export function comparisonWarnings(context: SolvedContext): readonly string[] {
  return [
    ...parameterWarnings(context),
    ...goodnessWarnings(context),
    ...trendWarnings(context),
    ...countWarnings(context),
  ];
}

function parameterWarnings({ register, fit, comparison, data }: SolvedContext): string[] {
  const warnings: string[] = [];
  for (const { quantity, value, atBound } of fit?.parameters ?? []) {
    if (!atBound) continue;
    const shown = formatValue(
      { value, u: null },
      register.quantities.get(quantity)?.unit ?? '1',
      register.evidence.settings.rounding,
    );
    warnings.push(
      `${symbolName(register, quantity)} ended on its bound, ${shown}: the trials would take it further.`,
    );
  }
  if (fit !== null && fit.condition > POOR_CONDITION)
    warnings.push(
      `${listInWords(data.free.map(({ quantity }) => symbolName(register, quantity)))} are hard to tell apart by these trials.`,
    );
  if (comparison.weights === 'relative' && fit !== null)
    warnings.push(
      'The weights are relative: the residuals set the uncertainty, so that the fit is no test of the model.',
    );
  return warnings;
}

function goodnessWarnings({ goodness: { chiSquared, degreesOfFreedom, pValue } }: SolvedContext): string[] {
  if (chiSquared === null || degreesOfFreedom === null || pValue === null) return [];
  const ratio = (chiSquared / degreesOfFreedom).toPrecision(2);
  if (pValue < LOW_P)
    return [
      `χ² is ${ratio} for each degree of freedom: the trials differ from the model by more than their uncertainties.`,
    ];
  if (pValue > HIGH_P)
    return [
      `χ² is only ${ratio} for each degree of freedom: the uncertainties are larger than the trials need.`,
    ];
  return [];
}

/**
 * Runs of one sign too long to be chance, in the order of the first input that varies. Only where something was
 * fitted: the residuals of a prediction lean to one side by what they share.
 */
function trendWarnings({ register, data, goodness, fit }: SolvedContext): string[] {
  const residuals = fit === null ? null : goodness.residuals;
  const along = [...data.leaves].find(([, { values }]) => values.some((value) => value !== at(values, 0)));
  if (residuals === null || along === undefined) return [];
  const order = [...residuals.keys()].sort((a, b) => rowOf(along[1].values, a) - rowOf(along[1].values, b));
  const test = runsTest(order.map((row) => at(residuals, row)));
  if (test === null || test.pValue >= LOW_P || test.runs >= test.expected) return [];
  return [
    `The residuals follow a trend along ${symbolName(register, along[0])}: something that depends on it is missing in the model.`,
  ];
}

function countWarnings({ data, fit }: SolvedContext): string[] {
  const left = data.used.length - (fit?.parameters.length ?? 0);
  if (fit === null || left > 2) return [];
  return [`Only ${counted(left, 'trial')} more than free parameters: the fit is hardly tested.`];
}
