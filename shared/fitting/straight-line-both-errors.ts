import { at } from '#shared/numeric/element.ts';
import { sum } from '#shared/numeric/sum.ts';

/** Points of a line with standard uncertainties in both coordinates. */
export interface PointsWithErrors {
  /** Length n each; x in one unit X, y in one unit Y. */
  readonly x: Float64Array;
  readonly y: Float64Array;
  /** Standard uncertainties, length n each, ≥ 0, not both 0 for a point. */
  readonly xSigmas: Float64Array;
  readonly ySigmas: Float64Array;
  /** Correlation of the errors of x and y of one point, length n, each within ±1; absent means 0. */
  readonly correlations?: Float64Array | undefined;
}

/** A line y = intercept + slope · x, or why there is none. */
export type StraightLine =
  | {
      readonly status: 'converged';
      readonly slope: number;
      readonly intercept: number;
      /** Standard errors when the u given are believed; not scaled by √(χ²/ν). */
      readonly slopeError: number;
      readonly interceptError: number;
      readonly covariance: number;
      /** S of the source: Σ Wᵢ (yᵢ − a − b xᵢ)². */
      readonly chiSquared: number;
      /** n − 2. */
      readonly degreesOfFreedom: number;
      readonly iterations: number;
    }
  /** All x are equal: any slope fits as well as any other. */
  | { readonly status: 'not determined' }
  | { readonly status: 'not converged'; readonly slope: number; readonly iterations: number }
  | { readonly status: 'too few observations'; readonly observations: number; readonly needed: number };

/** The slope has settled when it moves by less than this share of itself … */
const SETTLED = 1e-14;

/** … or by less than this share of its standard error, which is beyond any use. */
const SETTLED_IN_ERRORS = 1e-12;

/** The source needs about 10 rounds; points whose errors are strongly correlated need more. */
const MAX_ITERATIONS = 500;

/**
 * Best straight line through points with errors in both coordinates, correlated or not.
 *
 * Formula: with Wᵢ = 1/(σ_y² + b²σ_x² − 2b r σ_xσ_y), U and V the deviations from the weighted means and
 * βᵢ = Wᵢ[U σ_y² + b V σ_x² − (b U + V) r σ_xσ_y], iterate b = Σ Wβ V / Σ Wβ U.
 * Source: D. York, N. M. Evensen, M. López Martínez, J. De Basabe Delgado, Am. J. Phys. 72, 367 (2004), section III.
 * Accuracy: the ten points of the source's table I to 9 digits.
 *
 * @param points - coordinates and uncertainties
 * @returns slope in Y/X, intercept in Y and their errors, or why there is none
 * @throws RangeError when lengths differ or an uncertainty or correlation is not usable
 * @example straightLineBothErrors({ x: Float64Array.of(0, 1, 2), y: Float64Array.of(1, 3, 5), xSigmas: Float64Array.of(1, 1, 1), ySigmas: Float64Array.of(1, 1, 1) }).slope.toFixed(9) // => '2.000000000'
 */
export function straightLineBothErrors(points: PointsWithErrors): StraightLine {
  checkPoints(points);
  const observations = points.x.length;
  if (observations < 2) return { status: 'too few observations', observations, needed: 2 };
  if (points.x.every((value) => value === at(points.x, 0))) return { status: 'not determined' };

  let round = roundAt(points, startingSlope(points));
  for (let iterations = 1; iterations <= MAX_ITERATIONS; iterations++) {
    const next = roundAt(points, round.nextSlope);
    const line = lineFrom(points, next, iterations);
    const left = Math.abs(next.nextSlope - next.slope);
    if (left <= Math.max(SETTLED * Math.abs(next.slope), SETTLED_IN_ERRORS * line.slopeError)) return line;
    round = next;
  }
  return { status: 'not converged', slope: round.slope, iterations: MAX_ITERATIONS };
}

/** The weighted picture of the points for one slope, and the slope that follows from it. */
interface Round {
  readonly slope: number;
  readonly nextSlope: number;
  readonly weights: Float64Array;
  readonly xMean: number;
  readonly yMean: number;
  /** βᵢ of the source: x adjusted to the line, less the weighted mean. */
  readonly adjusted: Float64Array;
}

function roundAt(points: PointsWithErrors, slope: number): Round {
  const { x, y, xSigmas, ySigmas } = points;
  const mixed = x.map((_, i) => at(xSigmas, i) * at(ySigmas, i) * (points.correlations?.[i] ?? 0));
  const weights = x.map(
    (_, i) => 1 / (at(ySigmas, i) ** 2 + (slope * at(xSigmas, i)) ** 2 - 2 * slope * at(mixed, i)),
  );
  const xMean = weightedSum(weights, x) / sum(weights);
  const yMean = weightedSum(weights, y) / sum(weights);
  const across = x.map((value) => value - xMean);
  const up = y.map((value) => value - yMean);
  const adjusted = x.map((_, i) => {
    const [u, v] = [at(across, i), at(up, i)];
    const own = u * at(ySigmas, i) ** 2 + slope * v * at(xSigmas, i) ** 2;
    return at(weights, i) * (own - (slope * u + v) * at(mixed, i));
  });
  const pull = weights.map((weight, i) => weight * at(adjusted, i));
  return {
    slope,
    nextSlope: weightedSum(pull, up) / weightedSum(pull, across),
    weights,
    xMean,
    yMean,
    adjusted,
  };
}

/** Errors from the adjusted points, as the source's equations (13b) to (13d). */
function lineFrom(
  { x, y }: PointsWithErrors,
  { slope, weights, xMean, yMean, adjusted }: Round,
  iterations: number,
): StraightLine & { status: 'converged' } {
  const whole = sum(weights);
  const adjustedMean = weightedSum(weights, adjusted) / whole;
  const spread = sum(weights.map((weight, i) => weight * (at(adjusted, i) - adjustedMean) ** 2));
  const slopeVariance = 1 / spread;
  const centre = xMean + adjustedMean;
  const deviations = x.map((value, i) => at(y, i) - yMean - slope * (value - xMean));
  return {
    status: 'converged',
    slope,
    intercept: yMean - slope * xMean,
    slopeError: Math.sqrt(slopeVariance),
    interceptError: Math.sqrt(1 / whole + centre * centre * slopeVariance),
    covariance: -centre * slopeVariance,
    chiSquared: sum(weights.map((weight, i) => weight * at(deviations, i) ** 2)),
    degreesOfFreedom: x.length - 2,
    iterations,
  };
}

/** Least-squares slope of y on x without weights. */
function startingSlope({ x, y }: PointsWithErrors): number {
  const ones = x.map(() => 1 / x.length);
  const xMean = weightedSum(ones, x);
  const yMean = weightedSum(ones, y);
  const across = x.map((value) => value - xMean);
  return (
    weightedSum(
      across,
      y.map((value) => value - yMean),
    ) / weightedSum(across, across)
  );
}

function weightedSum(weights: Float64Array, values: Float64Array): number {
  return sum(weights.map((weight, i) => weight * at(values, i)));
}

function checkPoints({ x, y, xSigmas, ySigmas, correlations }: PointsWithErrors): void {
  const lengths = [y, xSigmas, ySigmas, correlations ?? x].map((column) => column.length);
  if (lengths.some((length) => length !== x.length))
    throw new RangeError(
      `straightLineBothErrors: needs columns of length ${x.length}, got ${lengths.join(', ')}`,
    );
  x.forEach((_, i) => {
    const [xSigma, ySigma, correlation] = [at(xSigmas, i), at(ySigmas, i), correlations?.[i] ?? 0];
    const usable = xSigma >= 0 && ySigma >= 0 && xSigma + ySigma > 0 && xSigma + ySigma < Infinity;
    if (!usable)
      throw new RangeError(
        `straightLineBothErrors: needs sigmas ≥ 0, not both 0, got ${xSigma} and ${ySigma} at ${i}`,
      );
    if (!(Math.abs(correlation) <= 1))
      throw new RangeError(
        `straightLineBothErrors: needs correlations within ±1, got ${correlation} at ${i}`,
      );
  });
}
