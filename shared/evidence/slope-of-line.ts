import { at, item } from '#shared/numeric/element.ts';
import type { Column, Part } from './findings.ts';
import { rowOf, type Uncertain } from './uncertain.ts';

/** Slope of a line through a column, with what its scatter and the shared sources make of it. */
export interface LineSlope {
  readonly slope: number;
  /** From the residuals, n − 2 degrees of freedom. */
  readonly u: number;
  readonly shared: readonly Part[];
}

/**
 * Unweighted least-squares slope of y against x. Shared sources of either side are carried by the derivatives of
 * the slope, which are linear in y and (yᵢ − ȳ − 2b(xᵢ − x̄))/Sxx in xᵢ.
 *
 * Source: JCGM 100:2008, H.3.
 *
 * @param x - one row for each of `rows`, in their order
 * @returns null where x does not vary
 */
export function slopeOfLine(x: Uncertain, y: Column, rows: readonly number[]): LineSlope | null {
  const n = rows.length;
  const xs = rows.map((_, i) => rowOf(x.values, i));
  const ys = rows.map((row) => at(y.values, row));
  const [meanX, meanY] = [sum(xs) / n, sum(ys) / n];
  const spread = sum(xs.map((value) => (value - meanX) ** 2));
  if (xs.every((value) => value === xs[0])) return null;
  const slope = sum(xs.map((value, i) => (value - meanX) * (item(ys, i) - meanY))) / spread;
  const residuals = ys.map((value, i) => value - meanY - slope * (item(xs, i) - meanX));
  const variance = sum(residuals.map((value) => value * value)) / (n - 2);
  const shared = new Map<string, number>();
  const add = (source: string, c: number): unknown => shared.set(source, (shared.get(source) ?? 0) + c);
  for (const { source, c } of y.shared)
    add(source, sum(rows.map((row, i) => ((item(xs, i) - meanX) / spread) * at(c, row))));
  for (const { source, kind, c } of x.terms) {
    if (kind !== 'shared') continue;
    const derivative = (i: number): number => (item(residuals, i) - slope * (item(xs, i) - meanX)) / spread;
    add(source, sum(rows.map((_, i) => derivative(i) * rowOf(c, i))));
  }
  const parts = [...shared].map(([source, c]) => ({ source, c })).filter(({ c }) => c !== 0);
  return { slope, u: Math.sqrt(variance / spread), shared: parts };
}

function sum(values: readonly number[]): number {
  let total = 0;
  for (const value of values) total += value;
  return total;
}
