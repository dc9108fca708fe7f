import { sumOfSquares } from './sum-of-squares.ts';

/** A pooled scatter and how well it is known. */
export interface PooledStdDev {
  readonly value: number;
  readonly degreesOfFreedom: number;
}

/**
 * Scatter pooled over groups of repeated readings that are taken to scatter alike.
 *
 * Formula: s_p² = Σ νᵢ sᵢ² / Σ νᵢ with νᵢ = nᵢ − 1. Source: JCGM 100:2008, H.3.6 and H.5.2.2.
 *
 * @param groups - readings of each group, all in one unit U; groups of one or none add nothing
 * @returns s_p in U with Σ νᵢ degrees of freedom, or null when no group has two readings
 * @example pooledStdDev([[1, 3], [5, 7], [9]]).degreesOfFreedom // => 2
 */
export function pooledStdDev(groups: readonly ArrayLike<number>[]): PooledStdDev | null {
  let squares = 0;
  let degreesOfFreedom = 0;
  for (const group of groups) {
    if (group.length < 2) continue;
    squares += sumOfSquares(group);
    degreesOfFreedom += group.length - 1;
  }
  if (degreesOfFreedom === 0) return null;
  return { value: Math.sqrt(squares / degreesOfFreedom), degreesOfFreedom };
}
