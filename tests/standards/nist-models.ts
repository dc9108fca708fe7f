import { at } from '#shared/numeric/element.ts';

/** Value of a model and its derivatives by the parameters, at one x. */
export type NistModel = (b: Float64Array, x: number) => { value: number; derivatives: readonly number[] };

const parameters =
  (b: Float64Array): ((index: number) => number) =>
  (index) =>
    at(b, index - 1);

/** b1 (1 − exp(−b2 x)): Misra1a and BoxBOD. */
const saturation: NistModel = (b, x) => {
  const p = parameters(b);
  const decay = Math.exp(-p(2) * x);
  return { value: p(1) * (1 - decay), derivatives: [1 - decay, p(1) * x * decay] };
};

/** Quotient of two cubics: Hahn1 and Thurber. */
const cubicOverCubic: NistModel = (b, x) => {
  const p = parameters(b);
  const powers = [1, x, x * x, x * x * x];
  const below = 1 + p(5) * x + p(6) * x ** 2 + p(7) * x ** 3;
  const value = (p(1) + p(2) * x + p(3) * x ** 2 + p(4) * x ** 3) / below;
  const upper = powers.map((power) => power / below);
  return { value, derivatives: [...upper, ...powers.slice(1).map((power) => (-value * power) / below)] };
};

/** b1 / (1 + exp(b2 − b3 x))^(1/b4). */
const generalLogistic: NistModel = (b, x) => {
  const p = parameters(b);
  const growth = Math.exp(p(2) - p(3) * x);
  const share = (1 + growth) ** (-1 / p(4));
  const value = p(1) * share;
  const slope = (-value / p(4)) * (growth / (1 + growth));
  return { value, derivatives: [share, slope, -slope * x, (value * Math.log1p(growth)) / p(4) ** 2] };
};

/** b1 (x² + b2 x) / (x² + b3 x + b4). */
const quadraticOverQuadratic: NistModel = (b, x) => {
  const p = parameters(b);
  const below = x * x + p(3) * x + p(4);
  const shape = (x * x + p(2) * x) / below;
  const value = p(1) * shape;
  return { value, derivatives: [shape, (p(1) * x) / below, (-value * x) / below, -value / below] };
};

/** (b1/b2) exp(−½ ((x − b3)/b2)²). */
const peak: NistModel = (b, x) => {
  const p = parameters(b);
  const z = (x - p(3)) / p(2);
  const bell = Math.exp(-0.5 * z * z) / p(2);
  const value = p(1) * bell;
  return { value, derivatives: [bell, (value * (z * z - 1)) / p(2), (value * z) / p(2)] };
};

/** b1 exp(b2 / (x + b3)). */
const vapour: NistModel = (b, x) => {
  const p = parameters(b);
  const inverse = 1 / (x + p(3));
  const growth = Math.exp(p(2) * inverse);
  const value = p(1) * growth;
  return { value, derivatives: [growth, value * inverse, -value * p(2) * inverse * inverse] };
};

/** b1 (b2 + x)^(−1/b3). */
const shiftedPower: NistModel = (b, x) => {
  const p = parameters(b);
  const base = p(2) + x;
  const power = base ** (-1 / p(3));
  const value = p(1) * power;
  return { value, derivatives: [power, -value / (p(3) * base), (value * Math.log(base)) / p(3) ** 2] };
};

/** Models of the nonlinear sets that are kept as fixtures, by the name of the set. */
export const NIST_MODELS: Readonly<Record<string, NistModel>> = {
  Misra1a: saturation,
  BoxBOD: saturation,
  Hahn1: cubicOverCubic,
  Thurber: cubicOverCubic,
  Rat43: generalLogistic,
  MGH09: quadraticOverQuadratic,
  Eckerle4: peak,
  MGH10: vapour,
  Bennett5: shiftedPower,
};
