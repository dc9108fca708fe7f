import type { Contribution } from './contribution.ts';

/** One input of a first-order combination: its contributions and the derivative of the result by it. */
export interface CombinedInput {
  readonly derivative: number;
  readonly contributions: readonly Contribution[];
}

/**
 * Contributions of a result made from uncertain inputs: sources in common add with their signs, so that shared
 * errors strengthen or cancel as they do in the value itself.
 *
 * Formula: cₛ(y) = Σᵢ (∂y/∂xᵢ) cₛ(xᵢ).
 * Source: JCGM 100:2008, 5.1.2 and 5.2.2, written per source.
 * A source that cancels exactly is left out; the others stand in the order in which they first occur.
 *
 * @param inputs - the inputs of the result, any number
 * @returns contributions in the unit of the result
 * @example combineContributions([{ derivative: 2, contributions: [{ source: 'rule', c: 0.1 }] }])[0]?.c // => 0.2
 */
export function combineContributions(inputs: readonly CombinedInput[]): Contribution[] {
  const sums = new Map<string, number>();
  for (const { derivative, contributions } of inputs)
    for (const { source, c } of contributions) sums.set(source, (sums.get(source) ?? 0) + derivative * c);
  const combined: Contribution[] = [];
  for (const [source, c] of sums) if (c !== 0) combined.push({ source, c });
  return combined;
}
