import type { Contribution } from './contribution.ts';

/** One line of a budget. */
export interface BudgetLine {
  readonly source: string;
  /** Signed contribution, in the value's unit. */
  readonly c: number;
  /** Part of u² that it makes, 0 to 1; the shares of a budget add to 1. */
  readonly share: number;
}

/**
 * Uncertainty budget of a value, largest share first; equal shares in the order of their sources.
 *
 * Source: VIM (JCGM 200:2012), 2.33.
 *
 * @param contributions - each source once
 * @example uncertaintyBudget([{ source: 'rule', c: 3 }, { source: 'scatter', c: -4 }]).map(({ share }) => share) // => [0.64, 0.36]
 */
export function uncertaintyBudget(contributions: readonly Contribution[]): BudgetLine[] {
  let variance = 0;
  for (const { c } of contributions) variance += c * c;
  return contributions
    .map(({ source, c }) => ({ source, c, share: variance === 0 ? 0 : (c * c) / variance }))
    .sort((a, b) => b.share - a.share || (a.source < b.source ? -1 : 1));
}
