import { PREFIXES, UNITS, type NamedUnit, type Prefix } from './unit-table.ts';

/** A unit sign taken apart: `cm` is centi and metre. */
export interface PrefixedUnit {
  readonly prefix: Prefix | null;
  readonly unit: NamedUnit;
}

const BY_NAME: ReadonlyMap<string, NamedUnit> = new Map(
  UNITS.flatMap((unit) => unit.names.map((name) => [name, unit] as const)),
);

const found = new Map<string, PrefixedUnit | null>();

/**
 * The unit that a sign stands for, alone or with an SI prefix. The whole sign goes first, so `min` is a minute
 * and `cd` a candela.
 *
 * @param name - one sign, no powers: `cm`, `°`, `hPa`; µ may be written µ, μ or u
 * @example findNamedUnit('cm')?.prefix?.power // => -2
 * @example findNamedUnit('metres') // => null
 */
export function findNamedUnit(name: string): PrefixedUnit | null {
  const known = found.get(name);
  if (known !== undefined) return known;
  const result = lookUp(
    name.replace('μ', 'µ').replace('\u2126', 'Ω').replace('\u212B', 'Å').replace('\u00BA', '°'),
  );
  // Names come from typed text: keep the memory bounded.
  if (found.size < 2000) found.set(name, result);
  return result;
}

function lookUp(name: string): PrefixedUnit | null {
  const whole = BY_NAME.get(name);
  if (whole !== undefined) return { prefix: null, unit: whole };
  for (const prefix of PREFIXES) {
    for (const sign of prefix.sign === 'µ' ? ['µ', 'u'] : [prefix.sign]) {
      if (!name.startsWith(sign)) continue;
      const unit = BY_NAME.get(name.slice(sign.length));
      if (unit?.takesPrefix === true) return { prefix, unit };
    }
  }
  return null;
}
