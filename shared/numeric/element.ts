/**
 * Element of a column, checked: reading outside of it is a mistake of the caller, never a silent undefined.
 *
 * @param values - column, length n
 * @param index - integer, 0 ≤ index < n
 * @returns the element
 * @throws RangeError when index lies outside
 * @example at(Float64Array.of(3, 5), 1) // => 5
 */
export function at(values: Float64Array, index: number): number {
  const value = values[index];
  if (value === undefined) throw new RangeError(`at: needs an index below ${values.length}, got ${index}`);
  return value;
}

/**
 * Item of an array, checked as in `at`.
 *
 * @param items - array, length n, without holes
 * @param index - integer, 0 ≤ index < n
 * @returns the item
 * @throws RangeError when index lies outside
 * @example item(['a', 'b'], 1) // => 'b'
 */
export function item<T>(items: readonly T[], index: number): T {
  const value = items[index];
  if (value === undefined) throw new RangeError(`item: needs an index below ${items.length}, got ${index}`);
  return value;
}
