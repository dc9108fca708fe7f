import { at } from '#shared/numeric/element.ts';
import { cholesky } from '#shared/numeric/cholesky.ts';
import { aicc } from '#shared/fitting/aicc.ts';
import { goodnessOfFit } from '#shared/fitting/goodness-of-fit.ts';
import type { ComparisonData } from './comparison-data.ts';
import type { Goodness } from './comparison-fit.ts';
import { columnOfSource, comparisonModel } from './comparison-model.ts';
import type { Register } from './register.ts';
import { rowOf, type Term } from './uncertain.ts';

const UNKNOWN: Goodness = {
  chiSquared: null,
  degreesOfFreedom: null,
  pValue: null,
  aicc: null,
  residuals: null,
};

/**
 * Goodness of a prediction with nothing left free: χ² with the full covariance of the differences, so that an
 * error common to all trials (of the ruler, of a fitted constant) is one error and not many.
 *
 * Formula: χ² = rᵀV⁻¹r with V = D + GGᵀ, D the variances own to each trial, a column of G for each shared source;
 * V⁻¹ by Woodbury: χ² = rᵀD⁻¹r − bᵀ(1 + GᵀD⁻¹G)⁻¹b, b = GᵀD⁻¹r.
 * Source: Nucl. Instrum. Meth. A 346, 306 (1994), equation 1; W. H. Press and others, Numerical Recipes, 2.7.3.
 */
export function predictionGoodness(register: Register, data: ComparisonData): Goodness {
  const model = comparisonModel(register, data);
  const predicted = model.predict(new Float64Array(0), 'shared errors');
  const measured = model.measured();
  const terms = differenceTerms(data.measured.terms, predicted.terms, model.rows);
  const variances = new Float64Array(model.rows);
  for (const { kind, c } of terms)
    if (kind !== 'shared')
      for (let row = 0; row < model.rows; row++) variances[row] = at(variances, row) + at(c, row) ** 2;
  const residuals = measured.map((value, row) => value - rowOf(predicted.values, row));
  if (variances.some((variance) => !(variance > 0)) || !residuals.every(Number.isFinite)) return UNKNOWN;
  const shared = terms.filter(({ kind }) => kind === 'shared').map(({ c }) => c);
  const chiSquared = correlatedChiSquared(residuals, variances, shared);
  const n = model.rows;
  if (chiSquared === null) return UNKNOWN;
  return {
    chiSquared,
    degreesOfFreedom: n,
    pValue: goodnessOfFit(chiSquared, n).pValue,
    aicc: aicc(chiSquared, 0, n),
    residuals: residuals.map((value, row) => value / Math.sqrt(at(variances, row))),
  };
}

/** Terms of measured − predicted, each source once, spread over all rows. */
function differenceTerms(
  measured: readonly Term[],
  predicted: readonly Term[],
  rows: number,
): readonly Term[] {
  const sources = new Map<string, Term>();
  for (const term of [...measured, ...predicted]) sources.set(`${term.kind}:${term.source}`, term);
  const side = (terms: readonly Term[], { source, kind }: Term): Float64Array =>
    columnOfSource({ values: new Float64Array(0), terms, known: true, hue: 'measured' }, source, kind, rows);
  return [...sources.values()].map((term) => {
    const model = side(predicted, term);
    return { ...term, c: side(measured, term).map((c, row) => c - at(model, row)) };
  });
}

function correlatedChiSquared(
  residuals: Float64Array,
  variances: Float64Array,
  shared: readonly Float64Array[],
): number | null {
  const weighted = (a: Float64Array, b: Float64Array): number => {
    let sum = 0;
    for (let row = 0; row < a.length; row++) sum += (at(a, row) * at(b, row)) / at(variances, row);
    return sum;
  };
  const size = shared.length;
  const inner = new Float64Array(size * size);
  shared.forEach((a, i) =>
    shared.forEach((b, j) => {
      if (j <= i) inner[i * size + j] = inner[j * size + i] = weighted(a, b) + (i === j ? 1 : 0);
    }),
  );
  const result = cholesky(inner, size);
  if (result.status !== 'factored') return null;
  let chiSquared = weighted(residuals, residuals);
  const forward: number[] = [];
  shared.forEach((column, i) => {
    let rest = weighted(column, residuals);
    forward.forEach((value, j) => (rest -= at(result.factor, i * size + j) * value));
    const value = rest / at(result.factor, i * size + i);
    forward.push(value);
    chiSquared -= value * value;
  });
  return chiSquared;
}
