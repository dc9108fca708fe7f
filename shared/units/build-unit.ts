import {
  addRational,
  formatRational,
  multiplyRational,
  numberToRational,
  powerRational,
  RATIONAL_ONE,
  rationalToNumber,
  type Rational,
} from '#shared/numeric/rational.ts';
import { DIMENSIONLESS, multiplyDimensions, powerDimension } from './dimension.ts';
import { findNamedUnit } from './find-named-unit.ts';
import type { Unit, UnitFactor } from './unit.ts';

/**
 * The unit that some factors make together: its exact size, its dimension and its canonical text.
 *
 * @param factors - each with a prefix and name of the table
 * @returns null when a root of a factor with π or an offset is asked for
 * @throws RangeError for a name that is not in the table
 * @example buildUnit([{ prefix: 'c', name: 'm', power: { n: 2n, d: 1n } }])?.scale // => 0.0001
 * @example buildUnit([])?.text // => '1'
 */
export function buildUnit(factors: readonly []): Unit;
export function buildUnit(factors: readonly UnitFactor[]): Unit | null;
export function buildUnit(factors: readonly UnitFactor[]): Unit | null {
  let size: Size | null = { factor: RATIONAL_ONE, piPower: 0, exact: true };
  let dimension = DIMENSIONLESS;
  let offset: Rational | undefined;
  for (const { prefix, name, power } of factors) {
    const named = findNamedUnit(prefix + name);
    if (named === null) throw new RangeError(`buildUnit: needs a known unit, got ${prefix}${name}`);
    const ten = powerRational({ n: 10n, d: 1n }, named.prefix?.power ?? 0);
    const base = {
      factor: multiplyRational(ten, named.unit.factor),
      piPower: named.unit.piPower,
      exact: named.unit.exact,
    };
    size = product(size, raise(base, power));
    dimension = multiplyDimensions(dimension, powerDimension(named.unit.dimension, power));
    offset = named.unit.offset ?? offset;
  }
  if (size === null) return null;
  const pi = Math.PI ** size.piPower;
  return {
    text: canonicalText(factors),
    dimension,
    offset,
    ...size,
    scale: rationalToNumber(size.factor) * pi,
    inverseScale: rationalToNumber({ n: size.factor.d, d: size.factor.n }) / pi,
    factors: [...factors],
  };
}

type Size = Pick<Unit, 'factor' | 'piPower' | 'exact'>;

function product(a: Size | null, b: Size | null): Size | null {
  if (a === null || b === null) return null;
  return {
    factor: multiplyRational(a.factor, b.factor),
    piPower: a.piPower + b.piPower,
    exact: a.exact && b.exact,
  };
}

function raise(base: Size, power: Rational): Size | null {
  if (power.d === 1n) {
    const whole = Number(power.n);
    return { factor: powerRational(base.factor, whole), piPower: base.piPower * whole, exact: base.exact };
  }
  if (base.piPower !== 0) return null;
  const root = exactRoot(base.factor, power.d);
  if (root !== null) return { factor: powerRational(root, Number(power.n)), piPower: 0, exact: base.exact };
  const rounded = rationalToNumber(base.factor) ** (Number(power.n) / Number(power.d));
  return { factor: numberToRational(rounded), piPower: 0, exact: false };
}

/** √(1/100) is 1/10; √(1/1000) is no fraction. */
function exactRoot(value: Rational, degree: bigint): Rational | null {
  const n = BigInt(Math.round(Number(value.n) ** (1 / Number(degree))));
  const d = BigInt(Math.round(Number(value.d) ** (1 / Number(degree))));
  return n ** degree === value.n && d ** degree === value.d ? { n, d } : null;
}

/** `N s/m`, `J/(kg K)`, `s^-1`, `1`: parsed back to the same unit. */
function canonicalText(factors: readonly UnitFactor[]): string {
  const above = factors.filter(({ power }) => power.n > 0n);
  const below = factors.filter(({ power }) => power.n < 0n);
  if (factors.length === 0) return '1';
  if (above.length === 0) return factors.map(written).join(' ');
  const top = above.map(written).join(' ');
  if (below.length === 0) return top;
  const bottom = below.map((factor) => written({ ...factor, power: negative(factor.power) })).join(' ');
  return below.length === 1 ? `${top}/${bottom}` : `${top}/(${bottom})`;
}

function written({ prefix, name, power }: UnitFactor): string {
  if (power.d !== 1n) return `${prefix}${name}^(${formatRational(power)})`;
  return power.n === 1n ? prefix + name : `${prefix}${name}^${power.n}`;
}

function negative(power: Rational): Rational {
  return addRational(power, { n: -2n * power.n, d: power.d });
}
