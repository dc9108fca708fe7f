import { findNamedUnit } from './find-named-unit.ts';
import { UNITS } from './unit-table.ts';

/** Habits of writing that are no unit signs, and what they mean. */
const HABITS: Readonly<Record<string, string>> = {
  sec: 's',
  secs: 's',
  second: 's',
  seconds: 's',
  msec: 'ms',
  usec: 'µs',
  mins: 'min',
  minute: 'min',
  minutes: 'min',
  hr: 'h',
  hrs: 'h',
  hour: 'h',
  hours: 'h',
  d: 'day',
  days: 'day',
  degree: '°',
  degrees: '°',
  grad: '°',
  celsius: '°C',
  '℃': '°C',
  meter: 'm',
  meters: 'm',
  metre: 'm',
  metres: 'm',
  micron: 'µm',
  microns: 'µm',
  gr: 'g',
  gram: 'g',
  grams: 'g',
  kgs: 'kg',
  kilo: 'kg',
  t: 'tonne',
  l: 'L',
  ml: 'mL',
  cl: 'cL',
  dl: 'dL',
  liter: 'L',
  litre: 'L',
  cc: 'cm^3',
  ccm: 'cm^3',
  sqm: 'm^2',
  mps: 'm/s',
  kph: 'km/h',
  kmh: 'km/h',
  in: 'inch',
  inches: 'inch',
  percent: '%',
  volts: 'V',
  volt: 'V',
  amp: 'A',
  amps: 'A',
  watt: 'W',
  watts: 'W',
  newton: 'N',
  newtons: 'N',
  joule: 'J',
  joules: 'J',
  hertz: 'Hz',
  kelvin: 'K',
  radians: 'rad',
  ohms: 'Ω',
  gauss: '10^-4 T',
  torr: 'mmHg',
  pixel: 'px',
};

/** Unit signs that a slip of one letter is looked for in; rarer ones would only mislead. */
const COMMON: readonly string[] = [
  ...['m', 'g', 's', 'N', 'Pa', 'J', 'W', 'V', 'A', 'T', 'Hz', 'L', 'rad', 'bar'].flatMap((sign) =>
    ['', 'm', 'c', 'k', 'µ', 'n'].map((prefix) => prefix + sign),
  ),
  ...UNITS.filter((unit) => !unit.takesPrefix).map((unit) => unit.names[0]),
  'hPa',
  'MHz',
  'MPa',
];

/**
 * Units that may be meant by a sign that is none: a habit of writing, two signs run together, the same letters in
 * another case, or one letter off. At most three, best first.
 *
 * @example suggestUnits('sec') // => ['s']
 * @example suggestUnits('Nm')[0] // => 'N m'
 * @example suggestUnits('cmm')[0] // => 'mm'
 */
export function suggestUnits(name: string): readonly string[] {
  const lower = name.toLowerCase();
  const habit = HABITS[name] ?? HABITS[lower];
  const raised = /^(\D+?)(-?\d)$/u.exec(name);
  const candidates = [
    ...(habit === undefined || habit.startsWith('10') ? [] : [habit]),
    ...(raised?.[1] !== undefined && findNamedUnit(raised[1]) !== null ? [`${raised[1]}^${raised[2]}`] : []),
    ...(lower === name ? [] : splits(name)),
    ...COMMON.filter((candidate) => candidate.toLowerCase() === lower),
    ...(name.length < 2 ? [] : COMMON.filter((candidate) => isOneEditAway(candidate, name))),
    ...(lower === name ? splits(name) : []),
  ];
  return [...new Set(candidates)].slice(0, 3);
}

/** `Nm` as `N m`: both halves must be units. */
function splits(name: string): readonly string[] {
  const letters = [...name];
  return letters
    .slice(1)
    .map((_, i) => [letters.slice(0, i + 1).join(''), letters.slice(i + 1).join('')] as const)
    .filter(([first, second]) => findNamedUnit(first) !== null && findNamedUnit(second) !== null)
    .map(([first, second]) => `${first} ${second}`);
}

/** One letter added, dropped or changed, or two neighbours exchanged; signs of one letter are never near. */
function isOneEditAway(candidate: string, name: string): boolean {
  if (candidate.length < 2 || Math.abs(candidate.length - name.length) > 1) return false;
  let start = 0;
  while (start < candidate.length && candidate[start] === name[start]) start += 1;
  let end = 0;
  const shorter = Math.min(candidate.length, name.length);
  while (end < shorter - start && candidate.at(-1 - end) === name.at(-1 - end)) end += 1;
  const leftCandidate = candidate.slice(start, candidate.length - end);
  const leftName = name.slice(start, name.length - end);
  if (leftCandidate.length <= 1 && leftName.length <= 1) return true;
  return leftCandidate.length === 2 && leftCandidate === [...leftName].reverse().join('');
}
