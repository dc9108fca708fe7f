import { at, item } from '#shared/numeric/element.ts';
import { aicc } from '#shared/fitting/aicc.ts';
import type { ConvergedFit } from '#shared/fitting/fit-outcome.ts';
import { fitWithInputUncertainties } from '#shared/fitting/fit-with-input-uncertainties.ts';
import { goodnessOfFit } from '#shared/fitting/goodness-of-fit.ts';
import { scaleCovariance } from '#shared/fitting/scale-covariance.ts';
import { correlatedContributions } from '#shared/uncertainty/correlated-contributions.ts';
import { isConstant, type ComparisonData } from './comparison-data.ts';
import {
  columnOfSource,
  comparisonModel,
  ownSources,
  parameterSource,
  residualSlope,
  type ComparisonModel,
} from './comparison-model.ts';
import { fault } from './fault.ts';
import type { Fault, Part } from './findings.ts';
import { fitSensitivities, type FitSolution } from './fit-sensitivities.ts';
import { symbolName, trialName, type Register } from './register.ts';
import { rowOf, type Term } from './uncertain.ts';
import { counted, listInWords } from './words.ts';

/** One parameter as found. */
export interface FoundParameter {
  readonly quantity: string;
  readonly value: number;
  /** Statistical parts (columns of the Cholesky factor), and those from shared sources. */
  readonly fitParts: readonly Part[];
  readonly sharedParts: readonly Part[];
  readonly atBound: boolean;
}

/** Goodness of a comparison, and its standardised residuals over the used trials. */
export interface Goodness {
  readonly chiSquared: number | null;
  readonly degreesOfFreedom: number | null;
  readonly pValue: number | null;
  readonly aicc: number | null;
  /** (measured − predicted) over its own u, by used trial; null where no weights are known. */
  readonly residuals: Float64Array | null;
}

/** A comparison's free parameters, found. */
export interface SolvedFit extends Goodness {
  readonly parameters: readonly FoundParameter[];
  readonly covariance: readonly number[];
  readonly condition: number;
}

/** Finds a comparison's free parameters. At least one is free. */
export function solveComparison(register: Register, data: ComparisonData): SolvedFit | Fault {
  const model = comparisonModel(register, data);
  const weights = outputSigmas(register, data, model);
  if ('shape' in weights) return weights;
  const { outcome, sigmas } = fitWithInputUncertainties(fitProblem(data, model, weights));
  if (outcome.status !== 'converged') return failedFit(register, data, outcome);
  const relative = data.comparison.weights === 'relative';
  const covariance = relative
    ? scaleCovariance(outcome.covariance, outcome.chiSquared, outcome.degreesOfFreedom)
    : outcome.covariance;
  if (covariance === null) return tooFew(register, data, data.free.length + 1);
  const statistical = correlatedContributions(covariance, (column) => `fit:${data.comparison.id}:${column}`);
  if (statistical === null)
    return notDetermined(
      register,
      data,
      data.free.map((_, i) => i),
    );
  const { chiSquared, degreesOfFreedom } = outcome;
  return {
    parameters: foundIn({ data, model, outcome, outputSigmas: weights }, statistical),
    covariance: [...covariance],
    condition: outcome.condition,
    chiSquared,
    degreesOfFreedom,
    pValue: relative ? null : goodnessOfFit(chiSquared, degreesOfFreedom).pValue,
    aicc: relative ? null : aicc(chiSquared, data.free.length, data.used.length),
    residuals: standardised(model, outcome, sigmas),
  };
}

function foundIn(solution: FitSolution, statistical: readonly Part[][]): readonly FoundParameter[] {
  const { data, outcome } = solution;
  const sensitivities = fitSensitivities(solution);
  return data.free.map(({ quantity }, i) => ({
    quantity,
    value: at(outcome.parameters, i),
    fitParts: item(statistical, i),
    sharedParts: sensitivities
      .map(({ source, byParameter }) => ({ source, c: at(byParameter, i) }))
      .filter(({ c }) => c !== 0),
    atBound: outcome.atBound[i] === true,
  }));
}

function standardised(model: ComparisonModel, outcome: ConvergedFit, sigmas: Float64Array): Float64Array {
  const predicted = model.predict(outcome.parameters, 'nothing');
  return model.measured().map((value, row) => (value - rowOf(predicted.values, row)) / at(sigmas, row));
}

/** u of the measured side that the model's own errors have no part in; a fault where a trial would have no weight. */
function outputSigmas(
  register: Register,
  data: ComparisonData,
  model: ComparisonModel,
): Float64Array | Fault {
  const inputs = new Set(ownSources(data).map(termKey));
  const squares = new Float64Array(model.rows);
  for (const term of data.measured.terms)
    if (term.kind !== 'shared' && !inputs.has(termKey(term)))
      for (let row = 0; row < model.rows; row++) squares[row] = at(squares, row) + rowOf(term.c, row) ** 2;
  const start = model.predict(
    Float64Array.from(data.free, ({ start }) => start),
    'own errors',
  );
  const weightless = data.used.findIndex(
    (_, row) => at(squares, row) === 0 && !slopeAt(data, start.terms, row),
  );
  if (weightless < 0) return squares.map(Math.sqrt);
  const noneKnown = data.used.every((_, row) => at(squares, row) === 0);
  if (data.comparison.weights === 'relative' && noneKnown && inputs.size === 0) return squares.fill(1);
  if (!noneKnown) return weightlessTrial(register, data, weightless);
  const symbol = symbolName(register, data.model.output);
  return fault(
    'uncertainty not positive',
    `The readings of ${symbol} carry no uncertainty of their own, so that they cannot be weighed. Give ${symbol} an instrument, or choose relative weights.`,
    data.model.output,
  );
}

function weightlessTrial(register: Register, data: ComparisonData, row: number): Fault {
  const symbol = symbolName(register, data.model.output);
  const trial = trialName(register, item(data.used, row).id);
  return fault(
    'uncertainty not positive',
    `${symbol} of ${trial} carries no uncertainty of its own, so that it cannot be weighed. Give it one.`,
    data.model.output,
  );
}

function slopeAt(data: ComparisonData, terms: readonly Term[], row: number): boolean {
  return [...terms, ...data.measured.terms].some(
    (term) => term.kind !== 'shared' && rowOf(term.c, row) !== 0,
  );
}

function termKey({ kind, source }: Term): string {
  return `${kind}:${source}`;
}

type FitProblem = Parameters<typeof fitWithInputUncertainties>[0];

function fitProblem(data: ComparisonData, model: ComparisonModel, sigmas: Float64Array): FitProblem {
  const own = ownSources(data);
  const ones = new Float64Array(model.rows).fill(1);
  return {
    observed: model.measured(),
    outputSigmas: sigmas,
    inputSigmas: own.map(() => ones),
    parameters: data.free.map(({ start, min, max }) => ({ start, min, max })),
    model: (p, out) => {
      const { values } = model.predict(p, 'nothing');
      for (let row = 0; row < out.length; row++) out[row] = rowOf(values, row);
    },
    jacobian: (p, columns) => {
      const value = model.predict(p, 'parameters');
      columns.forEach((column, i) =>
        column.set(columnOfSource(value, parameterSource(i), 'shared', model.rows)),
      );
    },
    inputSlopes: (p, columns) => {
      const value = model.predict(p, 'own errors');
      own.forEach(({ source, kind }, i) =>
        item(columns, i).set(residualSlope(data, value.terms, source, kind, model.rows)),
      );
    },
  };
}

function failedFit(
  register: Register,
  data: ComparisonData,
  outcome: Exclude<ReturnType<typeof fitWithInputUncertainties>['outcome'], ConvergedFit>,
): Fault {
  const { comparison } = data;
  const symbols = listInWords(data.free.map(({ quantity }) => symbolName(register, quantity)));
  switch (outcome.status) {
    case 'too few observations':
      return tooFew(register, data, outcome.needed);
    case 'not determined':
      return notDetermined(register, data, outcome.undetermined);
    case 'not converged':
      return fault(
        'not converged',
        `The fit of “${comparison.name}” did not settle. Start ${symbols} nearer to where it should be, or give it bounds.`,
        comparison.id,
      );
    case 'uncertainty not positive':
      return weightlessTrial(register, data, outcome.observation);
    case 'not finite': {
      const trial = trialName(register, data.used[outcome.observation]?.id ?? '');
      const where =
        outcome.where === 'start'
          ? `at the start value of ${symbols}`
          : `where the search for ${symbols} led`;
      return fault(
        'not finite',
        `The model gives no finite ${outcome.what === 'derivative' ? 'slope' : 'value'} for ${trial} ${where}. Change the start, or give bounds.`,
        comparison.id,
      );
    }
  }
}

function tooFew(register: Register, data: ComparisonData, needed: number): Fault {
  const symbols = listInWords(data.free.map(({ quantity }) => symbolName(register, quantity)));
  return fault(
    'too few trials',
    `${counted(data.used.length, 'trial')} ${data.used.length === 1 ? 'is' : 'are'} not enough to find ${symbols}. At least ${needed} are needed.`,
    data.comparison.id,
  );
}

function notDetermined(register: Register, data: ComparisonData, undetermined: readonly number[]): Fault {
  const names = undetermined.map((i) => symbolName(register, data.free[i]?.quantity ?? ''));
  const varying = [...data.leaves].filter(([, leaf]) => leaf.values.length > 1);
  if (data.free.length > 1 && varying.length > 0 && varying.every(([, leaf]) => isConstant(leaf))) {
    const inputs = listInWords(varying.map(([id]) => symbolName(register, id)));
    return fault(
      'constant input',
      `${inputs} has the same value in every trial used, so that ${listInWords(names)} cannot be told apart. Log trials at other settings.`,
      data.comparison.id,
    );
  }
  const verb = names.length === 1 ? 'is' : 'are';
  return fault(
    'not determined',
    `${listInWords(names)} ${verb} not determined by these trials. Free fewer parameters, or log trials at other settings.`,
    data.comparison.id,
  );
}
