import { checkEquation } from '#shared/expressions/check-equation.ts';
import { compileTape, type Tape } from '#shared/expressions/compile-tape.ts';
import type { Expression, NamedSymbol, ParseResult } from '#shared/expressions/expression.ts';
import { parseExpression } from '#shared/expressions/parse-expression.ts';
import { DIMENSIONLESS, type Dimension } from '#shared/units/dimension.ts';
import { parseUnit } from '#shared/units/parse-unit.ts';
import { fault, passedOn } from './fault.ts';
import type { Fault } from './findings.ts';
import { symbolName, type Register } from './register.ts';

/** An expression that is ready to run: parsed, its units checked. Inputs are ids, in the order of the tape. */
export interface CompiledExpression {
  readonly expression: Expression;
  readonly inputs: readonly string[];
  readonly tape: Tape;
}

const parsed = new WeakMap<readonly NamedSymbol[], Map<string, ParseResult>>();
const compiled = new WeakMap<readonly NamedSymbol[], Map<string, CompiledExpression | Fault>>();
const tapes = new Map<string, Tape>();

/** More tapes than any problem holds; beyond it the oldest go. */
const MOST_TAPES = 4000;

/** A stored expression, parsed against the register; each text once for each state of the register. */
export function parsedExpression(register: Register, text: string): ParseResult {
  let known = parsed.get(register.symbols);
  if (known === undefined) parsed.set(register.symbols, (known = new Map()));
  let result = known.get(text);
  if (result === undefined) known.set(text, (result = parseExpression(text, register.symbols)));
  return result;
}

/** The tape of an expression: one for each stored text, so that it outlives a change of the register. */
function tapeOf(expression: Expression): Tape {
  const known = tapes.get(expression.stored);
  if (known !== undefined) return known;
  const oldest = tapes.keys().next().value;
  if (tapes.size >= MOST_TAPES && oldest !== undefined) tapes.delete(oldest);
  const tape = compileTape(expression, expression.inputs);
  tapes.set(expression.stored, tape);
  return tape;
}

/** The row an equation stands in, for faults: the quantity it is a definition of, or a model. */
export interface EquationPlace {
  readonly defines: string;
  readonly text: string;
  readonly at: string;
}

/** Compiles `defines = text`: syntax, names and units are checked. Each once for each state of the register. */
export function compileEquation(register: Register, place: EquationPlace): CompiledExpression | Fault {
  let known = compiled.get(register.symbols);
  if (known === undefined) compiled.set(register.symbols, (known = new Map()));
  const key = `${place.at} ${place.defines} ${place.text}`;
  let result = known.get(key);
  if (result === undefined) known.set(key, (result = compile(register, place)));
  return result;
}

function compile(register: Register, place: EquationPlace): CompiledExpression | Fault {
  const result = parsedExpression(register, place.text);
  const name = symbolName(register, place.defines);
  if (!result.ok)
    return fault(result.fault.code, `${name}: ${result.fault.sentence}`, place.at, result.fault.span);
  const { expression } = result;
  const unknown = [place.defines, ...expression.inputs].map((id) => unitFault(register, id, place));
  const first = unknown.find((found) => found !== null);
  if (first !== undefined && first !== null) return first;
  const mismatch = checkEquation({
    left: register.quantities.get(place.defines)?.unit ?? '1',
    expression,
    dimensionOf: (id) => dimensionOfQuantity(register, id),
    unitOf: (id) => register.quantities.get(id)?.unit ?? '1',
  });
  if (mismatch !== null)
    return fault(mismatch.code, `${name}: ${mismatch.sentence}`, place.at, mismatch.span);
  return { expression, inputs: expression.inputs, tape: tapeOf(expression) };
}

function unitFault(register: Register, id: string, place: EquationPlace): Fault | null {
  const quantity = register.quantities.get(id);
  if (quantity === undefined)
    return fault('source gone', 'A quantity of the equation is gone. Put another in its place.', place.at);
  const unit = parseUnit(quantity.unit);
  if (unit.ok) return null;
  const own = fault(unit.code, `${symbolName(register, id)}: ${unit.sentence}`, id);
  return id === place.defines ? own : passedOn(own, symbolName(register, id));
}

/** What kind of quantity a register row is; a pure number where its unit cannot be read. */
export function dimensionOfQuantity(register: Register, id: string): Dimension {
  const unit = parseUnit(register.quantities.get(id)?.unit ?? '1');
  return unit.ok ? unit.unit.dimension : DIMENSIONLESS;
}
