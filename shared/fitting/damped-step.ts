import { at, item } from '#shared/numeric/element.ts';
import { norm } from '#shared/numeric/norm.ts';
import { multiplyUpper, solveUpper, solveUpperTransposed } from '#shared/numeric/upper-triangular.ts';

/** R·x ≈ −b in the order of the pivoted columns: one linearisation as the damping sees it. */
export interface TriangularSystem {
  /** R, k × k, row-major. */
  readonly triangle: Float64Array;
  /** order[j] is the parameter at position j. */
  readonly order: readonly number[];
  /** Leading part of Qᵀr, length k. */
  readonly projected: Float64Array;
}

/** A step with the damping that gave it. */
export interface DampedStep {
  /** Length k, in the order of the parameters. */
  readonly step: Float64Array;
  readonly damping: number;
}

/** The radius need only be met to this share of it. */
const RADIUS_TOLERANCE = 0.1;

/** Smallest positive normal double: stands for a damping that has come out as zero. */
const SMALLEST = 2.2250738585072014e-308;

/** The Newton iteration for the damping rarely needs more than three rounds. */
const MAX_ROUNDS = 10;

/**
 * Levenberg-Marquardt step inside a trust region: the least |r + J·δ| with |D·δ| ≤ radius.
 *
 * Method: the damping λ with (JᵀJ + λD²)δ = −Jᵀr and |D·δ| = radius, by Hebden's Newton iteration between bounds;
 * λ = 0 where the Gauss-Newton step already fits.
 * Source: J. J. Moré, Lecture Notes in Mathematics 630, 105 (1978), section 5.
 *
 * @param system - QR factors of J and Qᵀr
 * @param scales - D, length k, in the order of the parameters, > 0
 * @param radius - Δ > 0
 * @param guess - damping to try first, ≥ 0
 */
export function dampedStep(
  system: TriangularSystem,
  scales: Float64Array,
  radius: number,
  guess: number,
): DampedStep {
  const size = scales.length;
  const { triangle, order } = system;
  const rank = leadingRank(triangle, size);
  const undamped = unpermuted(solveUpper(triangle, size, system.projected, rank), order);
  let length = norm(times(scales, undamped));
  let excess = length - radius;
  if (excess <= RADIUS_TOLERANCE * radius) return { step: undamped, damping: 0 };

  let lower = 0;
  if (rank === size) {
    const direction = solveUpperTransposed(triangle, size, towardsRadius(scales, undamped, length, order));
    lower = excess / radius / norm(direction) ** 2;
  }
  const gradient = scaledGradient(system, scales);
  let upper = norm(gradient) / radius;
  if (upper === 0) upper = SMALLEST / Math.min(radius, RADIUS_TOLERANCE);
  let damping = Math.min(Math.max(guess, lower), upper);
  if (damping === 0) damping = norm(gradient) / length;

  for (let round = 1; ; round++) {
    if (damping === 0) damping = Math.max(SMALLEST, 0.001 * upper);
    const damped = solveDamped(system, scales, Math.sqrt(damping));
    const before = excess;
    length = norm(times(scales, damped.step));
    excess = length - radius;
    const met = Math.abs(excess) <= RADIUS_TOLERANCE * radius;
    const stuck = lower === 0 && excess <= before && before < 0;
    if (met || stuck || round === MAX_ROUNDS) return { step: damped.step, damping };
    const direction = solveUpperTransposed(
      damped.triangle,
      size,
      towardsRadius(scales, damped.step, length, order),
    );
    const correction = excess / radius / norm(direction) ** 2;
    if (excess > 0) lower = Math.max(lower, damping);
    else upper = Math.min(upper, damping);
    damping = Math.max(lower, damping + correction);
  }
}

/** Rows of R before its first zero on the diagonal. */
function leadingRank(triangle: Float64Array, size: number): number {
  let rank = 0;
  while (rank < size && at(triangle, rank * size + rank) !== 0) rank++;
  return rank;
}

/** −x in the order of the parameters. */
function unpermuted(solution: Float64Array, order: readonly number[]): Float64Array {
  const step = new Float64Array(solution.length);
  order.forEach((index, position) => (step[index] = -at(solution, position)));
  return step;
}

function times(scales: Float64Array, step: Float64Array): Float64Array {
  return step.map((value, j) => value * at(scales, j));
}

/** Pᵀ·D²δ / |Dδ|: how the length changes with the step. */
function towardsRadius(
  scales: Float64Array,
  step: Float64Array,
  length: number,
  order: readonly number[],
): Float64Array {
  return Float64Array.from(
    order,
    (index) => at(scales, index) * ((at(scales, index) * at(step, index)) / length),
  );
}

/** D⁻¹·Jᵀr, in the order of the positions. */
function scaledGradient(
  { triangle, order, projected }: TriangularSystem,
  scales: Float64Array,
): Float64Array {
  const size = scales.length;
  return Float64Array.from(order, (index, column) => {
    let total = 0;
    for (let row = 0; row <= column; row++) total += at(triangle, row * size + column) * at(projected, row);
    return total / at(scales, index);
  });
}

/**
 * Step of the system with the rows √λ·D added below, by Givens rotations; also the triangle S with
 * SᵀS = Pᵀ(JᵀJ + λD²)P.
 */
function solveDamped(
  system: TriangularSystem,
  scales: Float64Array,
  rootDamping: number,
): { step: Float64Array; triangle: Float64Array } {
  const size = scales.length;
  const triangle = system.triangle.slice();
  const right = system.projected.slice();
  for (let j = 0; j < size; j++) {
    const added = new Float64Array(size);
    added[j] = rootDamping * at(scales, item(system.order, j));
    let addedRight = 0;
    for (let k = j; k < size; k++) {
      const diagonal = at(triangle, k * size + k);
      const below = at(added, k);
      if (below === 0) continue;
      const hypotenuse = Math.hypot(diagonal, below);
      const cosine = diagonal / hypotenuse;
      const sine = below / hypotenuse;
      for (let column = k; column < size; column++) {
        const above = at(triangle, k * size + column);
        const under = at(added, column);
        triangle[k * size + column] = cosine * above + sine * under;
        added[column] = cosine * under - sine * above;
      }
      const rightAbove = at(right, k);
      right[k] = cosine * rightAbove + sine * addedRight;
      addedRight = cosine * addedRight - sine * rightAbove;
    }
  }
  const solution = solveUpper(triangle, size, right, leadingRank(triangle, size));
  return { step: unpermuted(solution, system.order), triangle };
}

/**
 * J·δ as Q sees it: |result| = |J·δ|.
 *
 * @param system - QR factors of J
 * @param step - δ, length k, in the order of the parameters
 * @returns R·Pᵀδ, length k
 */
export function imageOf({ triangle, order }: TriangularSystem, step: Float64Array): Float64Array {
  const permuted = Float64Array.from(order, (index) => at(step, index));
  return multiplyUpper(triangle, order.length, permuted);
}
