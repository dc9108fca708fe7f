import { at } from '#shared/numeric/element.ts';
import type { Hue, Part } from './findings.ts';

/**
 * How a value, or each value of a column, follows one source: its change when the source moves by its standard
 * uncertainty.
 *
 * kind: `shared`, one error for all rows; `own`, an independent error in each row, seen in the scatter of
 * repeats; `apart`, an independent error in each row that the scatter does not contain.
 */
export interface Term {
  readonly source: string;
  readonly kind: 'shared' | 'own' | 'apart';
  /** Length 1 (the same in every row) or the number of rows. */
  readonly c: Float64Array;
}

/** A value (length 1) or a column on its way through an evaluation, in SI, with everything it is uncertain by. */
export interface Uncertain {
  readonly values: Float64Array;
  /** Each source and kind once. */
  readonly terms: readonly Term[];
  /** False where nothing at all is known of its uncertainty. */
  readonly known: boolean;
  readonly hue: Hue;
}

/** A value that is uncertain by the given parts. */
export function uncertainValue(value: number, parts: readonly Part[], known: boolean, hue: Hue): Uncertain {
  return {
    values: Float64Array.of(value),
    terms: parts.map(({ source, c }) => ({ source, kind: 'shared', c: Float64Array.of(c) })),
    known,
    hue,
  };
}

/** Element of a column that may be one value for all rows. */
export function rowOf(column: Float64Array, row: number): number {
  return column.length === 1 ? at(column, 0) : at(column, row);
}

/** Parts of one row: what is own to the row gets the name that `rowSource` gives it. */
export function partsOfRow(
  terms: readonly Term[],
  row: number,
  rowSource: (source: string) => string,
): Part[] {
  const parts: Part[] = [];
  for (const term of terms) {
    const c = rowOf(term.c, row);
    if (c !== 0) parts.push({ source: term.kind === 'shared' ? term.source : rowSource(term.source), c });
  }
  return parts;
}

/** √(Σ c²) of each row over the terms of some kinds; null when there are none. */
export function rootSumOfSquares(terms: readonly Term[], rows: number): Float64Array | null {
  if (terms.length === 0) return null;
  const sum = new Float64Array(rows);
  for (const { c } of terms) {
    if (c.length === rows)
      for (let row = 0; row < rows; row++) sum[row] = at(sum, row) + at(c, row) * at(c, row);
    else for (let row = 0; row < rows; row++) sum[row] = at(sum, row) + at(c, 0) * at(c, 0);
  }
  for (let row = 0; row < rows; row++) sum[row] = Math.sqrt(at(sum, row));
  return sum;
}
