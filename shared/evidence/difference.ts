import { combineContributions } from '#shared/uncertainty/combine-contributions.ts';
import {
  combinedDegreesOfFreedom,
  type SourceFreedom,
} from '#shared/uncertainty/combined-degrees-of-freedom.ts';
import { standardUncertainty } from '#shared/uncertainty/standard-uncertainty.ts';
import type { MadeOf, Part, Scalar } from './findings.ts';

/** The parts of a − b: what both share counts once, with its sign. */
export function differenceParts(a: Scalar, b: Scalar): Part[] {
  return combineContributions([
    { derivative: 1, contributions: a.parts },
    { derivative: -1, contributions: b.parts },
  ]);
}

/**
 * a − b as a finding. Nothing is said of its uncertainty when nothing is known of a's or of b's.
 *
 * @param parts - parts of the difference; default: those of a less those of b
 */
export function differenceOf(
  a: Scalar,
  b: Scalar,
  madeOf: MadeOf,
  freedomOf: (source: string) => SourceFreedom,
  parts: readonly Part[] = differenceParts(a, b),
): Scalar {
  const known = a.u !== null && b.u !== null;
  return {
    shape: 'scalar',
    value: a.value - b.value,
    u: known ? standardUncertainty(parts) : null,
    parts: known ? parts : [],
    degreesOfFreedom: known ? combinedDegreesOfFreedom(parts, freedomOf) : Infinity,
    unit: a.unit,
    hue: 'difference',
    madeOf,
    warnings: [],
  };
}

/** A difference over its standard uncertainty; null where that is not known or 0. */
export function zOf(difference: Scalar): number | null {
  return difference.u === null || !(difference.u > 0) ? null : difference.value / difference.u;
}

/** Both sides of a residual at trials that the model was fitted to. */
export interface FittedSides {
  readonly measured: Scalar;
  /** Source of the part of the measured mean that repeats average away. */
  readonly source: string;
  readonly predicted: Scalar;
  /** Comparisons that were fitted to all trials of the measured mean. */
  readonly fits: readonly string[];
}

/** Below this share of the readings' variance what is left of it is rounding: the fit goes through the point. */
const NOTHING_LEFT = 1e-9;

/**
 * Parts of measured − predicted where the model was fitted to these very trials: the two sides move together, so
 * that the variance is um² − up² of the fit's statistical part and not the sum. Shared sources count once, as
 * everywhere.
 *
 * Source: residuals of least squares have covariance V − J(JᵀV⁻¹J)⁻¹Jᵀ.
 */
export function residualParts({ measured, source, predicted, fits }: FittedSides): Part[] {
  const ofFit = (part: Part): boolean => fits.some((id) => part.source.startsWith(`fit:${id}:`));
  const own = (part: Part): boolean => part.source === source || part.source.startsWith('set:');
  const sum = (parts: readonly Part[]): number => parts.reduce((total, { c }) => total + c * c, 0);
  const parts = differenceParts(measured, predicted);
  const left = 1 - sum(predicted.parts.filter(ofFit)) / sum(parts.filter(own));
  const factor = left > NOTHING_LEFT ? Math.sqrt(left) : 0;
  return parts
    .filter((part) => !ofFit(part))
    .map((part) => (own(part) ? { source: part.source, c: part.c * factor } : part))
    .filter(({ c }) => c !== 0);
}
