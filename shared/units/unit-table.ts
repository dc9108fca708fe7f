import { rational, RATIONAL_ONE, type Rational } from '#shared/numeric/rational.ts';
import { dimension, type BaseQuantity, type Dimension } from './dimension.ts';

/** A unit as the table has it, without prefix and power. */
export interface NamedUnit {
  /** Canonical sign, then other ways to write it. */
  readonly names: readonly [string, ...string[]];
  readonly dimension: Dimension;
  readonly factor: Rational;
  readonly piPower: number;
  readonly offset?: Rational | undefined;
  readonly exact: boolean;
  readonly takesPrefix: boolean;
  readonly singular: string;
  readonly plural: string;
}

/** A prefix, its power of ten and its name when read aloud. */
export interface Prefix {
  readonly sign: string;
  readonly power: number;
  readonly spoken: string;
}

interface Options {
  readonly factor?: readonly [bigint, bigint];
  readonly pi?: number;
  readonly offset?: readonly [bigint, bigint];
  readonly rounded?: boolean;
  readonly prefix?: boolean;
}

/** SI prefixes (SI Brochure, 9th edition with the additions of 2022, section 3.1). `u` is read as µ. */
export const PREFIXES: readonly Prefix[] = [
  { sign: 'Q', power: 30, spoken: 'quetta' },
  { sign: 'R', power: 27, spoken: 'ronna' },
  { sign: 'Y', power: 24, spoken: 'yotta' },
  { sign: 'Z', power: 21, spoken: 'zetta' },
  { sign: 'E', power: 18, spoken: 'exa' },
  { sign: 'P', power: 15, spoken: 'peta' },
  { sign: 'T', power: 12, spoken: 'tera' },
  { sign: 'G', power: 9, spoken: 'giga' },
  { sign: 'M', power: 6, spoken: 'mega' },
  { sign: 'k', power: 3, spoken: 'kilo' },
  { sign: 'h', power: 2, spoken: 'hecto' },
  { sign: 'da', power: 1, spoken: 'deca' },
  { sign: 'd', power: -1, spoken: 'deci' },
  { sign: 'c', power: -2, spoken: 'centi' },
  { sign: 'm', power: -3, spoken: 'milli' },
  { sign: 'µ', power: -6, spoken: 'micro' },
  { sign: 'n', power: -9, spoken: 'nano' },
  { sign: 'p', power: -12, spoken: 'pico' },
  { sign: 'f', power: -15, spoken: 'femto' },
  { sign: 'a', power: -18, spoken: 'atto' },
  { sign: 'z', power: -21, spoken: 'zepto' },
  { sign: 'y', power: -24, spoken: 'yocto' },
  { sign: 'r', power: -27, spoken: 'ronto' },
  { sign: 'q', power: -30, spoken: 'quecto' },
];

const SI: Options = { prefix: true };

/**
 * The units known. Factors are exact by definition (SI Brochure, 9th edition, tables 2, 4 and 8) unless marked
 * rounded. Single letters that people use for quantities (d, t, l, a) are left out on purpose.
 */
export const UNITS: readonly NamedUnit[] = [
  unit('m', 'metre', 'metres', { length: 1 }, SI),
  unit('g', 'gram', 'grams', { mass: 1 }, { prefix: true, factor: [1n, 1000n] }),
  unit('s', 'second', 'seconds', { time: 1 }, SI),
  unit('A', 'ampere', 'amperes', { 'electric current': 1 }, SI),
  unit('K', 'kelvin', 'kelvins', { temperature: 1 }, SI),
  unit('mol', 'mole', 'moles', { 'amount of substance': 1 }, SI),
  unit('cd', 'candela', 'candelas', { 'luminous intensity': 1 }, SI),
  unit('rad', 'radian', 'radians', { angle: 1 }, SI),
  unit('sr', 'steradian', 'steradians', { angle: 2 }, SI),
  unit('Hz', 'hertz', 'hertz', { time: -1 }, SI),
  unit('N', 'newton', 'newtons', { mass: 1, length: 1, time: -2 }, SI),
  unit('Pa', 'pascal', 'pascals', { mass: 1, length: -1, time: -2 }, SI),
  unit('J', 'joule', 'joules', { mass: 1, length: 2, time: -2 }, SI),
  unit('W', 'watt', 'watts', { mass: 1, length: 2, time: -3 }, SI),
  unit('C', 'coulomb', 'coulombs', { 'electric current': 1, time: 1 }, SI),
  unit('V', 'volt', 'volts', { mass: 1, length: 2, time: -3, 'electric current': -1 }, SI),
  unit('F', 'farad', 'farads', { mass: -1, length: -2, time: 4, 'electric current': 2 }, SI),
  unit(['Ω', 'ohm', 'Ohm'], 'ohm', 'ohms', { mass: 1, length: 2, time: -3, 'electric current': -2 }, SI),
  unit('S', 'siemens', 'siemens', { mass: -1, length: -2, time: 3, 'electric current': 2 }, SI),
  unit('Wb', 'weber', 'webers', { mass: 1, length: 2, time: -2, 'electric current': -1 }, SI),
  unit('T', 'tesla', 'teslas', { mass: 1, time: -2, 'electric current': -1 }, SI),
  unit('H', 'henry', 'henries', { mass: 1, length: 2, time: -2, 'electric current': -2 }, SI),
  unit('lm', 'lumen', 'lumens', { 'luminous intensity': 1, angle: 2 }, SI),
  unit('lx', 'lux', 'lux', { 'luminous intensity': 1, angle: 2, length: -2 }, SI),
  unit('Bq', 'becquerel', 'becquerels', { time: -1 }, SI),
  unit('Gy', 'gray', 'grays', { length: 2, time: -2 }, SI),
  unit('Sv', 'sievert', 'sieverts', { length: 2, time: -2 }, SI),
  unit(['°C', 'degC'], 'degree Celsius', 'degrees Celsius', { temperature: 1 }, { offset: [27315n, 100n] }),
  unit(['°', 'deg'], 'degree', 'degrees', { angle: 1 }, { factor: [1n, 180n], pi: 1 }),
  unit('arcmin', 'minute of arc', 'minutes of arc', { angle: 1 }, { factor: [1n, 10_800n], pi: 1 }),
  unit('arcsec', 'second of arc', 'seconds of arc', { angle: 1 }, { factor: [1n, 648_000n], pi: 1 }),
  unit('min', 'minute', 'minutes', { time: 1 }, { factor: [60n, 1n] }),
  unit('h', 'hour', 'hours', { time: 1 }, { factor: [3600n, 1n] }),
  unit('day', 'day', 'days', { time: 1 }, { factor: [86_400n, 1n] }),
  unit('L', 'litre', 'litres', { length: 3 }, { prefix: true, factor: [1n, 1000n] }),
  unit('tonne', 'tonne', 'tonnes', { mass: 1 }, { factor: [1000n, 1n] }),
  unit('bar', 'bar', 'bars', { mass: 1, length: -1, time: -2 }, { prefix: true, factor: [100_000n, 1n] }),
  unit('atm', 'atmosphere', 'atmospheres', { mass: 1, length: -1, time: -2 }, { factor: [101_325n, 1n] }),
  unit(
    'mmHg',
    'millimetre of mercury',
    'millimetres of mercury',
    { mass: 1, length: -1, time: -2 },
    { factor: [133_322_387_415n, 1_000_000_000n] },
  ),
  unit('Å', 'ångström', 'ångströms', { length: 1 }, { factor: [1n, 10_000_000_000n] }),
  unit('inch', 'inch', 'inches', { length: 1 }, { factor: [254n, 10_000n] }),
  unit(
    'eV',
    'electronvolt',
    'electronvolts',
    { mass: 1, length: 2, time: -2 },
    { prefix: true, factor: [1_602_176_634n, 10n ** 28n] },
  ),
  // CODATA 2022: 1.660 539 068 92(52) × 10^-27 kg, a measured figure.
  unit(
    ['u', 'Da'],
    'dalton',
    'daltons',
    { mass: 1 },
    { factor: [166_053_906_892n, 10n ** 38n], rounded: true },
  ),
  unit('%', 'percent', 'percent', {}, { factor: [1n, 100n] }),
  unit('‰', 'per mille', 'per mille', {}, { factor: [1n, 1000n] }),
  unit('ppm', 'part per million', 'parts per million', {}, { factor: [1n, 1_000_000n] }),
  unit('ppb', 'part per billion', 'parts per billion', {}, { factor: [1n, 1_000_000_000n] }),
  unit(['frames', 'frame'], 'frame', 'frames', { count: 1 }),
  unit(['counts', 'count'], 'count', 'counts', { count: 1 }),
  unit(['px', 'pixel', 'pixels'], 'pixel', 'pixels', { count: 1 }),
  unit(['rev', 'turn', 'turns'], 'revolution', 'revolutions', { count: 1 }),
  unit('fps', 'frame per second', 'frames per second', { count: 1, time: -1 }),
  // A rotational frequency (ISO 80000-3): revolutions, not radians, per minute.
  unit(
    'rpm',
    'revolution per minute',
    'revolutions per minute',
    { count: 1, time: -1 },
    { factor: [1n, 60n] },
  ),
];

function unit(
  names: string | readonly [string, ...string[]],
  singular: string,
  plural: string,
  exponents: Partial<Record<BaseQuantity, number>>,
  options: Options = {},
): NamedUnit {
  return {
    names: typeof names === 'string' ? [names] : names,
    dimension: dimension(exponents),
    factor: options.factor === undefined ? RATIONAL_ONE : rational(...options.factor),
    piPower: options.pi ?? 0,
    offset: options.offset === undefined ? undefined : rational(...options.offset),
    exact: options.rounded !== true,
    takesPrefix: options.prefix === true,
    singular,
    plural,
  };
}
