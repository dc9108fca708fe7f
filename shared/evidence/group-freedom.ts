import { randomPart } from './mean-of-group.ts';
import { rowsWithValue } from './place.ts';
import type { Values } from './values.ts';

/**
 * Degrees of freedom of the scatter behind the mean of a group.
 *
 * @param key - key of the mean: `q@series{setting=value}`; behind `|` the trials, where not all of the group's
 */
export function freedomOfGroupMean(values: Values, key: string): number {
  const [whole = '', trials] = key.split('|');
  const [quantity = '', groupKey = ''] = whole.split('@');
  const group = values.groups(groupKey.split('{')[0] ?? '').find((one) => one.key === groupKey);
  if (group === undefined) return Infinity;
  const column = values.finding(quantity, group.series);
  if (column.shape !== 'column') return Infinity;
  const rows = rowsWithValue(column, trials === undefined ? group.kept : trials.split(','));
  return rows.length === 0
    ? Infinity
    : randomPart({ column, rows, leftOut: [], source: '' }).degreesOfFreedom;
}
