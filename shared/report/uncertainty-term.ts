import type { Evidence } from '#shared/evidence/evidence.ts';
import { findSource } from '#shared/evidence/find-source.ts';
import type { Findings, Scalar } from '#shared/evidence/findings.ts';
import { counted } from '#shared/evidence/words.ts';
import { groupDigits } from '#shared/formatting/digit-groups.ts';
import { scalarFigures } from '#shared/formatting/scalar-figures.ts';
import { requireUnit } from '#shared/formatting/unit-text.ts';
import type { ProvenanceTerm } from './provenance.ts';

/** Parts that are listed; the rest is told as one. */
const MOST_PARTS = 5;
/** A part of u² below this share goes with the rest. */
const SMALL_SHARE = 0.002;

/**
 * The line of a value's uncertainty with its independent parts, the largest first; none when nothing is known of it.
 *
 * @param unit - unit it is shown in
 * @returns one line, or none
 */
export function uncertaintyTerm(
  scalar: Scalar,
  unit: string,
  evidence: Evidence,
  findings: Findings,
): readonly ProvenanceTerm[] {
  if (scalar.u === null) return [];
  const write = (u: number) => uncertaintyFigures({ value: scalar.value, u: scalar.u }, u, unit, evidence);
  const total = scalar.u ** 2;
  const sources = bySource(scalar, evidence, findings);
  const listed = sources.filter(({ c }) => c ** 2 >= SMALL_SHARE * total).slice(0, MOST_PARTS);
  const rest = sources.slice(listed.length);
  const own = listed.length === 1 && rest.length === 0;
  const showsShares = scalar.madeOf.kind === 'expression';
  const parts = listed.map(({ words, c }) =>
    line(write(c), showsShares && !own ? `${words}, ${share(c ** 2 / total)} of u²` : words),
  );
  if (rest.length > 0) {
    const c = Math.hypot(...rest.map((part) => part.c));
    parts.push(line(write(c), `${counted(rest.length, 'smaller part')}`));
  }
  const words = own ? (listed[0]?.words ?? '') : 'together';
  return [{ ...line(`±\u00A0${write(scalar.u)}`, words), terms: own ? [] : parts }];
}

/** Contributions with equal words are told as one (the columns of one fit, say). */
function bySource(
  scalar: Scalar,
  evidence: Evidence,
  findings: Findings,
): readonly { words: string; c: number }[] {
  const squares = new Map<string, number>();
  for (const { source, c } of scalar.parts) {
    const { words } = findSource(findings, evidence, source);
    squares.set(words, (squares.get(words) ?? 0) + c * c);
  }
  return [...squares]
    .map(([words, square]) => ({ words, c: Math.sqrt(square) }))
    .filter(({ c }) => c > 0)
    .sort((a, b) => b.c - a.c);
}

/** A part in figures, with as many decimals as u itself has here. */
function uncertaintyFigures(
  whole: { value: number; u: number | null },
  part: number,
  unit: string,
  evidence: Evidence,
): string {
  const known = requireUnit(unit);
  const rule = evidence.settings.rounding;
  const figures = scalarFigures(whole, known, rule, rule === 'two digits' ? 0 : 1);
  if (figures === null || figures.u === null) return '';
  const places = figures.u.split('.')[1]?.length ?? 0;
  const scaled = (part * known.inverseScale) / 10 ** figures.power;
  return groupDigits(scaled.toFixed(places)) + (figures.power === 0 ? '' : `×10^${figures.power}`);
}

function share(of: number): string {
  const percent = of * 100;
  return percent < 1 ? 'under 1 %' : `${Math.round(percent)}\u00A0%`;
}

function line(value: string, words: string): ProvenanceTerm {
  return { value, symbol: null, words, hue: null, ref: null, terms: [] };
}
