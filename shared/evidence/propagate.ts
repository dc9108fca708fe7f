import { at } from '#shared/numeric/element.ts';
import type { Hue } from './findings.ts';
import { rowOf, type Term, type Uncertain } from './uncertain.ts';

/**
 * First-order propagation, row by row: every source reaches the result through each input that follows it, with
 * signs, so that what is common strengthens or cancels.
 *
 * @param values - the result, length 1 or the number of rows; kept, not copied
 * @param derivatives - of the result by each input, each of the result's length or of length 1; read only now
 * @param inputs - in the order of `derivatives`
 */
export function propagate(
  values: Float64Array,
  derivatives: readonly Float64Array[],
  inputs: readonly Uncertain[],
): Uncertain {
  const sums = new Map<string, { source: string; kind: Term['kind']; c: Float64Array }>();
  inputs.forEach((input, i) => {
    const derivative = derivatives[i];
    if (derivative === undefined) return;
    for (const { source, kind, c } of input.terms) {
      const key = `${kind}:${source}`;
      let sum = sums.get(key);
      if (sum === undefined) sums.set(key, (sum = { source, kind, c: new Float64Array(values.length) }));
      addProduct(sum.c, derivative, c);
    }
  });
  return {
    values,
    terms: [...sums.values()].filter(({ c }) => c.some((element) => element !== 0)),
    known: inputs.some(({ known }) => known),
    hue: mixedHue(inputs),
  };
}

function addProduct(sum: Float64Array, derivative: Float64Array, c: Float64Array): void {
  const n = sum.length;
  if (derivative.length === n && c.length === n)
    for (let i = 0; i < n; i++) sum[i] = at(sum, i) + at(derivative, i) * at(c, i);
  else for (let i = 0; i < n; i++) sum[i] = at(sum, i) + rowOf(derivative, i) * rowOf(c, i);
}

/** What is made from a prediction or a fit is predicted; what is made from readings alone is measured. */
function mixedHue(inputs: readonly Uncertain[]): Hue {
  const hues = new Set(inputs.map(({ hue }) => hue));
  if (hues.has('predicted')) return 'predicted';
  if (hues.has('difference')) return 'difference';
  return hues.has('measured') || hues.size === 0 ? 'measured' : 'count';
}
