import { at } from '#shared/numeric/element.ts';
import { compileEquation, type CompiledExpression } from './compiled-expression.ts';
import { fault, isFault, passedOn } from './fault.ts';
import type { Fault } from './findings.ts';
import { propagate } from './propagate.ts';
import { symbolName, type Register } from './register.ts';
import type { Uncertain } from './uncertain.ts';

/**
 * A place where quantities have values: the trials of a fit, the groups of a comparison, a setting that is asked
 * for. What the place does not know itself is computed there from equations.
 */
export interface Scope {
  /** The value of a quantity, as a model sees it: what the model defines comes from its own equations. */
  find(quantity: string, model: string | null): Uncertain | Fault;
}

/** What a place knows without any equation; null: compute it. */
export type KnownValues = (quantity: string) => Uncertain | Fault | null;

/**
 * A place of `rows` rows.
 *
 * @param known - values of the place; each of length 1 or `rows`
 */
export function createScope(register: Register, rows: number, known: KnownValues): Scope {
  const found = new Map<string, Uncertain | Fault>();
  const open = new Set<string>();

  function find(quantity: string, model: string | null): Uncertain | Fault {
    const key = `${model ?? ''}:${quantity}`;
    const before = found.get(key);
    if (before !== undefined) return before;
    if (open.has(key)) return cycleFault(register, quantity, model);
    open.add(key);
    const value = compute(quantity, model);
    open.delete(key);
    found.set(key, value);
    return value;
  }

  function compute(quantity: string, model: string | null): Uncertain | Fault {
    const equation = model === null ? null : modelEquation(register, model, quantity);
    if (equation !== null)
      return asPredicted(equationValue(register, equation, quantity, rows, (id) => find(id, model)));
    const value = known(quantity);
    if (value !== null) return value;
    const row = register.quantities.get(quantity);
    if (row?.def.origin === 'derived') {
      const derived = compileEquation(register, { defines: quantity, text: row.def.expr, at: quantity });
      return equationValue(register, derived, quantity, rows, (id) => find(id, null));
    }
    if (row?.def.origin === 'predicted') return findPredicted(quantity, row.def.model);
    return fault('source gone', `${symbolName(register, quantity)} has no value here.`, quantity);
  }

  function findPredicted(quantity: string, model: string): Uncertain | Fault {
    if (modelEquation(register, model, quantity) !== null) return find(quantity, model);
    return notDefined(register, quantity, model);
  }

  return { find };
}

/** What a model's equation gives is predicted, whatever it was made from. */
export function asPredicted(value: Uncertain | Fault): Uncertain | Fault {
  return isFault(value) ? value : { ...value, hue: 'predicted' };
}

/** That a model says nothing of a quantity. */
export function notDefined(register: Register, quantity: string, model: string): Fault {
  const symbol = symbolName(register, quantity);
  const row = register.models.get(model);
  return row === undefined
    ? fault('source gone', `The model that defines ${symbol} is gone. Choose another.`, quantity)
    : fault(
        'missing input',
        `Model ${row.n} has no equation for ${symbol}. Add one, or choose another model.`,
        model,
      );
}

/** The equation by which a model defines a quantity; null: it does not define it. */
export function modelEquation(
  register: Register,
  model: string,
  quantity: string,
): CompiledExpression | Fault | null {
  const equation = register.models.get(model)?.equations.find(({ defines }) => defines === quantity);
  if (equation === undefined) return null;
  return compileEquation(register, { defines: quantity, text: equation.expr, at: model });
}

/** Runs an equation over a place, with its uncertainty; a single value that is not finite is a fault. */
export function equationValue(
  register: Register,
  compiled: CompiledExpression | Fault,
  quantity: string,
  rows: number,
  find: (id: string) => Uncertain | Fault,
): Uncertain | Fault {
  if ('shape' in compiled) return compiled;
  const inputs: Uncertain[] = [];
  for (const id of compiled.inputs) {
    const input = find(id);
    if (isFault(input)) return passedOn(input, symbolName(register, id));
    inputs.push(input);
  }
  const value = runTape(compiled, inputs, rows);
  if (value.values.length !== 1 || Number.isFinite(at(value.values, 0))) return value;
  if (inputs.some(({ values }) => values.length === 1 && Number.isNaN(at(values, 0)))) return value;
  return fault(
    'not finite',
    `${symbolName(register, quantity)} does not come out as a finite number. Look for a division by zero or the root or logarithm of a negative number.`,
    quantity,
  );
}

/** Runs a tape over inputs of length 1 or `rows`; the result has length 1 when all inputs have. */
function runTape({ tape }: CompiledExpression, inputs: readonly Uncertain[], rows: number): Uncertain {
  const length = inputs.every(({ values }) => values.length === 1) ? 1 : rows;
  const columns = inputs.map(({ values }) => (values.length === 1 ? at(values, 0) : values));
  const values = tape.run(columns, length).slice();
  const uncertain = inputs.some(({ terms }) => terms.length > 0);
  return propagate(values, uncertain ? tape.gradient() : [], inputs);
}

function cycleFault(register: Register, quantity: string, model: string | null): Fault {
  const symbol = symbolName(register, quantity);
  return fault(
    'cycle',
    `${symbol} is defined through itself. Change its definition, or one that it uses.`,
    model ?? quantity,
  );
}
