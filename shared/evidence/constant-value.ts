import { sameDimension } from '#shared/units/dimension.ts';
import { parseUnit } from '#shared/units/parse-unit.ts';
import type { Instrument, Quantity, Reading, UncertaintyPart } from './evidence.ts';
import { fault } from './fault.ts';
import type { Fault, Part } from './findings.ts';
import {
  amountOf,
  ownUncertainty,
  statedParts,
  type PartsOwner,
  type StatedPart,
} from './instrument-parts.ts';
import { readValue } from './read-value.ts';
import { symbolName, type Register } from './register.ts';
import { uncertainValue, type Uncertain } from './uncertain.ts';

/** One reading to be turned into an uncertain value. */
export interface SingleReading {
  readonly reading: Reading;
  readonly quantity: Quantity;
  readonly instrument: string | null;
  /** Parts entered for this value alone. */
  readonly parts: readonly UncertaintyPart[];
  /** Start of the names of its own sources: `const:q`, `held:s:q`. */
  readonly source: string;
  /** Row to mend. */
  readonly at: string;
}

/** The instrument's parts for a quantity, none without an instrument. */
export function partsOfInstrument(
  register: Register,
  instrument: string | null,
  quantity: Quantity,
): readonly StatedPart[] | Fault {
  if (instrument === null) return [];
  const row = register.instruments.get(instrument);
  if (row === undefined)
    return fault(
      'source gone',
      `The instrument of ${symbolName(register, quantity.id)} is gone. Choose another, or none.`,
      quantity.id,
    );
  const owner = instrumentOwner(register, row, quantity);
  return 'shape' in owner ? owner : statedParts(row.parts, owner);
}

function instrumentOwner(register: Register, row: Instrument, quantity: Quantity): PartsOwner | Fault {
  return ownerOf(register, quantity, `The instrument “${row.name}”`, row.id);
}

function ownerOf(register: Register, quantity: Quantity, words: string, at: string): PartsOwner | Fault {
  const unit = parseUnit(quantity.unit);
  const symbol = symbolName(register, quantity.id);
  if (!unit.ok) return fault(unit.code, `${symbol}: ${unit.sentence}`, quantity.id);
  return { words, at, symbol, unit: unit.unit };
}

/** A reading in SI, refused where it cannot be read or is of another kind than its quantity; `words` name it then. */
export function checkedReading(
  register: Register,
  reading: Reading,
  quantity: Quantity,
  where: { readonly words: () => string; readonly at: string },
): { readonly value: number; readonly u: number | null } | Fault {
  const unit = parseUnit(quantity.unit);
  if (!unit.ok)
    return fault(unit.code, `${symbolName(register, quantity.id)}: ${unit.sentence}`, quantity.id);
  const read = readValue(reading);
  if (!read.ok) return fault(read.code, `${where.words()}: ${read.sentence}`, where.at);
  if (sameDimension(read.unit.dimension, unit.unit.dimension)) return read;
  return fault(
    'dimension mismatch',
    `${where.words()} is given in ${reading.unit}, but ${symbolName(register, quantity.id)} is in ${quantity.unit}. Give it in a unit of the same kind.`,
    where.at,
  );
}

/**
 * A constant or a held value: its own uncertainty as typed or as its instrument states it, its entered parts, and
 * whatever is common to all readings of the instrument.
 */
export function singleValue(register: Register, single: SingleReading): Uncertain | Fault {
  const { reading, quantity, source } = single;
  const symbol = symbolName(register, quantity.id);
  const read = checkedReading(register, reading, quantity, { words: () => symbol, at: single.at });
  if ('shape' in read) return read;
  const instrument = partsOfInstrument(register, single.instrument, quantity);
  if ('shape' in instrument) return instrument;
  const owner = ownerOf(register, quantity, symbol, quantity.id);
  if ('shape' in owner) return owner;
  const entered = statedParts(single.parts, owner);
  if ('shape' in entered) return entered;
  const own =
    read.u ??
    Math.hypot(ownUncertainty(instrument, read.value, false), ownUncertainty(instrument, read.value, true));
  const parts: Part[] = own === 0 ? [] : [{ source: `${source}:own`, c: own }];
  entered.forEach((part, i) => parts.push({ source: `${source}:${i}`, c: amountOf(part, read.value) }));
  for (const part of instrument)
    if (part.shared)
      parts.push({ source: `inst:${single.instrument ?? ''}:${part.name}`, c: amountOf(part, read.value) });
  return uncertainValue(read.value, parts, parts.length > 0, 'measured');
}
