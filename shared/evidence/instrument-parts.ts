import { decimalToNumber, parseDecimal } from '#shared/numeric/decimal.ts';
import { statedUncertainty } from '#shared/uncertainty/stated-uncertainty.ts';
import { uncertaintyToSi } from '#shared/units/convert.ts';
import { sameDimension } from '#shared/units/dimension.ts';
import { parseUnit } from '#shared/units/parse-unit.ts';
import type { Unit } from '#shared/units/unit.ts';
import type { UncertaintyPart } from './evidence.ts';
import { fault } from './fault.ts';
import type { Fault } from './findings.ts';

/** One stated part as a standard uncertainty. */
export interface StatedPart {
  /** Standard uncertainty: SI, or relative to the value. */
  readonly amount: number;
  readonly relative: boolean;
  readonly shared: boolean;
  /** Not contained in the scatter of repeats. */
  readonly apart: boolean;
  readonly degreesOfFreedom: number;
  /** 'offset', 'gain', 'offset2' …: the end of the name of a shared source. */
  readonly name: string;
}

/** Where the parts are stated, for sentences. */
export interface PartsOwner {
  /** "The steel rule". */
  readonly words: string;
  /** Row to mend. */
  readonly at: string;
  /** Symbol and unit of the quantity that they are for. */
  readonly symbol: string;
  readonly unit: Unit;
}

/** Stated parts as standard uncertainties of a quantity, or the first part that cannot be. */
export function statedParts(
  parts: readonly UncertaintyPart[],
  owner: PartsOwner,
): readonly StatedPart[] | Fault {
  const stated: StatedPart[] = [];
  const counts = { offset: 0, gain: 0 };
  for (const part of parts) {
    const amount = part.kind === 'scale' ? relativeAmount(part, owner) : absoluteAmount(part, owner);
    if (typeof amount !== 'number') return amount;
    const family = part.kind === 'scale' ? 'gain' : 'offset';
    if (part.shared) counts[family] += 1;
    stated.push({
      amount: statedUncertainty(part.kind === 'resolution' ? amount / 2 : amount, part.shape, part.k),
      relative: part.kind === 'scale',
      shared: part.shared,
      apart: part.notInScatter === true,
      degreesOfFreedom: part.degreesOfFreedom ?? Infinity,
      name: counts[family] < 2 ? family : `${family}${counts[family]}`,
    });
  }
  return stated;
}

function relativeAmount(part: UncertaintyPart, owner: PartsOwner): number | Fault {
  const unit = parseUnit(part.unit === '' ? '1' : part.unit);
  if (!unit.ok) return fault(unit.code, `${owner.words}: ${unit.sentence}`, owner.at);
  const amount = positiveAmount(part, owner);
  return typeof amount === 'number' ? uncertaintyToSi(amount, unit.unit) : amount;
}

function absoluteAmount(part: UncertaintyPart, owner: PartsOwner): number | Fault {
  const unit = parseUnit(part.unit);
  if (!unit.ok) return fault(unit.code, `${owner.words}: ${unit.sentence}`, owner.at);
  if (!sameDimension(unit.unit.dimension, owner.unit.dimension))
    return fault(
      'dimension mismatch',
      `${owner.words} states its uncertainty in ${part.unit}, but ${owner.symbol} is in ${owner.unit.text}. Give it in a unit of the same kind.`,
      owner.at,
    );
  const amount = positiveAmount(part, owner);
  return typeof amount === 'number' ? uncertaintyToSi(amount, unit.unit) : amount;
}

function positiveAmount(part: UncertaintyPart, owner: PartsOwner): number | Fault {
  const decimal = parseDecimal(part.amount);
  const amount = decimal === null ? NaN : decimalToNumber(decimal);
  if (!Number.isFinite(amount))
    return fault(
      'not a number',
      `${owner.words} states “${part.amount}”, which is not a number. Write it like 0.1.`,
      owner.at,
    );
  if (amount <= 0)
    return fault(
      'uncertainty not positive',
      `${owner.words} states an uncertainty of ${part.amount}. It must be more than 0; leave the part out where nothing is known.`,
      owner.at,
    );
  return amount;
}

/** Standard uncertainty of one reading from the parts that are its own (not shared), of one of the two kinds. */
export function ownUncertainty(parts: readonly StatedPart[], value: number, apart: boolean): number {
  let sum = 0;
  for (const part of parts)
    if (!part.shared && part.apart === apart) sum += (part.relative ? part.amount * value : part.amount) ** 2;
  return Math.sqrt(sum);
}

/** Signed contribution of a part at a value. */
export function amountOf(part: StatedPart, value: number): number {
  return part.relative ? part.amount * value : part.amount;
}
