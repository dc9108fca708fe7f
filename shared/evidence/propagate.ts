import { at } from '#shared/numeric/element.ts';
import type { Hue } from './findings.ts';
import type { Term, Uncertain } from './uncertain.ts';

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
  const reached = new Map<string, { source: string; kind: Term['kind']; products: Product[] }>();
  inputs.forEach((input, i) => {
    const derivative = derivatives[i];
    if (derivative === undefined) return;
    for (const { source, kind, c } of input.terms) {
      const key = kind + source;
      const term = reached.get(key);
      if (term === undefined) reached.set(key, { source, kind, products: [{ derivative, c }] });
      else term.products.push({ derivative, c });
    }
  });
  return {
    values,
    terms: summedTerms([...reached.values()], values.length),
    known: inputs.some(({ known }) => known),
    hue: mixedHue(inputs),
  };
}

interface Product {
  readonly derivative: Float64Array;
  readonly c: Float64Array;
}

/** Sums of products, all in one buffer: many small ones keep the garbage collector busy. Sums of nothing but zeros are left out. */
function summedTerms(
  reached: readonly { source: string; kind: Term['kind']; products: readonly Product[] }[],
  length: number,
): readonly Term[] {
  const buffer = new Float64Array(reached.length * length);
  const terms: Term[] = [];
  reached.forEach(({ source, kind, products }, index) => {
    const c = buffer.subarray(index * length, (index + 1) * length);
    for (const product of products) addProduct(c, product.derivative, product.c);
    if (c.some((element) => element !== 0)) terms.push({ source, kind, c });
  });
  return terms;
}

/** sum += derivative · c, row by row; either factor may be one value for all rows. */
function addProduct(sum: Float64Array, derivative: Float64Array, c: Float64Array): void {
  const n = sum.length;
  if (c.length === 1 || derivative.length === 1) {
    const [factor, column] = c.length === 1 ? [at(c, 0), derivative] : [at(derivative, 0), c];
    if (column.length === 1) for (let i = 0; i < n; i++) sum[i] = at(sum, i) + factor * at(column, 0);
    else for (let i = 0; i < n; i++) sum[i] = at(sum, i) + factor * at(column, i);
  } else for (let i = 0; i < n; i++) sum[i] = at(sum, i) + at(derivative, i) * at(c, i);
}

/** What is made from a prediction or a fit is predicted; what is made from readings alone is measured. */
function mixedHue(inputs: readonly Uncertain[]): Hue {
  const hues = new Set(inputs.map(({ hue }) => hue));
  if (hues.has('predicted')) return 'predicted';
  if (hues.has('difference')) return 'difference';
  return hues.has('measured') || hues.size === 0 ? 'measured' : 'count';
}
