/** One independent component of a combined uncertainty. */
export interface UncertaintyComponent {
  /** Contribution to the combined standard uncertainty (sensitivity times u); the sign does not matter. */
  readonly contribution: number;
  /** Degrees of freedom of its u, > 0; Infinity when it is taken to be exact. */
  readonly degreesOfFreedom: number;
}

/**
 * Effective degrees of freedom of a combined standard uncertainty.
 *
 * Formula (Welch-Satterthwaite): ν_eff = u_c⁴ / Σ (cᵢuᵢ)⁴/νᵢ. Source: JCGM 100:2008, equation (G.2b).
 * Not rounded: truncate to the next lower whole number where a printed table asks for one (G.4.1).
 *
 * @param components - independent contributions, all in one unit
 * @returns ν_eff; Infinity when no component limits it (none at all included)
 * @throws RangeError when degrees of freedom are not > 0
 * @example effectiveDegreesOfFreedom([{ contribution: 3, degreesOfFreedom: 4 }, { contribution: -3, degreesOfFreedom: 4 }]) // => 8
 */
export function effectiveDegreesOfFreedom(components: readonly UncertaintyComponent[]): number {
  const largest = components.reduce((most, { contribution }) => Math.max(most, Math.abs(contribution)), 0);
  if (largest === 0) return Infinity;
  let variance = 0;
  let limited = 0;
  for (const { contribution, degreesOfFreedom } of components) {
    if (!(degreesOfFreedom > 0))
      throw new RangeError(
        `effectiveDegreesOfFreedom: needs degrees of freedom > 0, got ${degreesOfFreedom}`,
      );
    // In units of the largest, so that fourth powers of nanometres do not vanish.
    const square = (contribution / largest) ** 2;
    variance += square;
    limited += (square * square) / degreesOfFreedom;
  }
  return limited === 0 ? Infinity : (variance * variance) / limited;
}
