import type { Contribution } from './contribution.ts';

/** How well a source's own standard uncertainty is known. */
export interface SourceFreedom {
  readonly degreesOfFreedom: number;
  /** Sources of one pool were estimated together (the columns of one fit) and count as one component. */
  readonly pool?: string | undefined;
}

/**
 * Effective degrees of freedom of a combined standard uncertainty (Welch-Satterthwaite).
 *
 * Formula: ν = u⁴ / Σ uᵢ⁴/νᵢ over independent components.
 * Source: JCGM 100:2008, G.4.1, equation G.2b.
 *
 * @param contributions - each source once
 * @param freedomOf - degrees of freedom of a source; Infinity where its u counts as exactly known
 * @returns ν > 0; Infinity when no source is limited
 * @example combinedDegreesOfFreedom([{ source: 'scatter', c: 2 }], () => ({ degreesOfFreedom: 4 })) // => 4
 */
export function combinedDegreesOfFreedom(
  contributions: readonly Contribution[],
  freedomOf: (source: string) => SourceFreedom,
): number {
  const pools = new Map<string, { variance: number; degreesOfFreedom: number }>();
  let variance = 0;
  for (const { source, c } of contributions) {
    const { degreesOfFreedom, pool = source } = freedomOf(source);
    variance += c * c;
    pools.set(pool, { variance: (pools.get(pool)?.variance ?? 0) + c * c, degreesOfFreedom });
  }
  if (variance === 0) return Infinity;
  let sum = 0;
  for (const part of pools.values()) sum += (part.variance / variance) ** 2 / part.degreesOfFreedom;
  return sum === 0 ? Infinity : 1 / sum;
}
