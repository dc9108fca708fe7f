import { parsedExpression } from './compiled-expression.ts';
import type { Comparison, Quantity } from './evidence.ts';
import type { Register } from './register.ts';

/** A thing that depends on others: a quantity of the register, an equation of a model, a comparison. */
export type Dependent =
  | { readonly kind: 'quantity'; readonly id: string }
  | { readonly kind: 'equation'; readonly model: string; readonly quantity: string }
  | { readonly kind: 'comparison'; readonly id: string };

/** Name of a dependent, unique in the problem. */
export function dependentName(dependent: Dependent): string {
  if (dependent.kind === 'equation') return `${dependent.model}:${dependent.quantity}`;
  return dependent.kind === 'quantity' ? dependent.id : `comparison:${dependent.id}`;
}

/** What a quantity, an equation or a comparison needs, one step down. */
export function directDependencies(register: Register, dependent: Dependent): readonly Dependent[] {
  if (dependent.kind === 'comparison') {
    const comparison = register.comparisons.get(dependent.id);
    return comparison === undefined ? [] : ofComparison(register, comparison);
  }
  if (dependent.kind === 'equation') return ofEquation(register, dependent.model, dependent.quantity);
  const quantity = register.quantities.get(dependent.id);
  return quantity === undefined ? [] : ofQuantity(register, quantity);
}

function ofQuantity(register: Register, { id, def }: Quantity): readonly Dependent[] {
  switch (def.origin) {
    case 'constant':
    case 'recorded':
      return [];
    case 'derived':
      return inputsOf(register, def.expr).map(quantity);
    case 'summary':
      return [
        def.of,
        ...(def.against === undefined ? [] : [def.against]),
        ...def.where.where.map((range) => range.quantity),
      ].map(quantity);
    case 'fitted':
      return [{ kind: 'comparison', id: def.comparison }];
    case 'predicted':
      return [{ kind: 'equation', model: def.model, quantity: id }];
  }
}

function ofEquation(register: Register, model: string, defines: string): readonly Dependent[] {
  const text = equationText(register, model, defines);
  return text === null ? [] : inputsOf(register, text).map((id) => inModel(register, model, id));
}

/** As a model sees a quantity: by its own equation, where it has one. */
function inModel(register: Register, model: string, id: string): Dependent {
  return equationText(register, model, id) === null
    ? quantity(id)
    : { kind: 'equation', model, quantity: id };
}

/**
 * A comparison needs what its model reaches without its free parameters, which it finds itself, and what it is
 * set against.
 */
function ofComparison(register: Register, comparison: Comparison): readonly Dependent[] {
  return comparisonInputs(register, comparison).leaves;
}

/** What a comparison rests on. */
export interface ComparisonInputs {
  /** Register quantities that it takes as they are. */
  readonly leaves: readonly Dependent[];
  /** Expressions that it computes itself, as stored. */
  readonly texts: readonly string[];
}

/** Everything that a comparison rests on, its free parameters left out. */
export function comparisonInputs(register: Register, comparison: Comparison): ComparisonInputs {
  const model = register.models.get(comparison.model);
  if (model === undefined) return { leaves: [], texts: [] };
  const texts: string[] = [];
  const free = new Set(comparison.free.map((parameter) => parameter.quantity));
  const leaves = new Map<string, Dependent>();
  const seen = new Set<string>();
  const open: Dependent[] = [model.output, ...model.limits.map((limit) => limit.quantity)].map((id) =>
    inModel(register, model.id, id),
  );
  open.push(...comparison.selection.where.map((range) => quantity(range.quantity)), quantity(model.output));
  for (let next = open.pop(); next !== undefined; next = open.pop()) {
    const name = dependentName(next);
    if (seen.has(name) || (next.kind === 'quantity' && free.has(next.id))) continue;
    seen.add(name);
    if (isComputed(register, next)) {
      open.push(...directDependencies(register, next));
      texts.push(`${name}=${textOf(register, next)}`);
    } else leaves.set(name, next);
  }
  return { leaves: [...leaves.values()], texts };
}

/** Computed by expression alone, so that a comparison can compute it anew for other parameters. */
function isComputed(register: Register, dependent: Dependent): boolean {
  if (dependent.kind !== 'quantity') return dependent.kind === 'equation';
  const origin = register.quantities.get(dependent.id)?.def.origin;
  return origin === 'derived' || origin === 'predicted';
}

function textOf(register: Register, dependent: Dependent): string {
  if (dependent.kind === 'equation') return equationText(register, dependent.model, dependent.quantity) ?? '';
  const def = dependent.kind === 'quantity' ? register.quantities.get(dependent.id)?.def : undefined;
  if (def?.origin === 'derived') return def.expr;
  return def?.origin === 'predicted' ? def.model : '';
}

/** Whether a quantity is computed from one of some parameters, without a fit or a statistic between. */
export function dependsOn(register: Register, id: string, parameters: ReadonlySet<string>): boolean {
  const seen = new Set<string>();
  const open: Dependent[] = [quantity(id)];
  for (let next = open.pop(); next !== undefined; next = open.pop()) {
    const name = dependentName(next);
    if (seen.has(name)) continue;
    seen.add(name);
    if (next.kind === 'quantity' && parameters.has(next.id)) return true;
    if (isComputed(register, next)) open.push(...directDependencies(register, next));
  }
  return false;
}

function quantity(id: string): Dependent {
  return { kind: 'quantity', id };
}

function equationText(register: Register, model: string, defines: string): string | null {
  const equations = register.models.get(model)?.equations ?? [];
  return equations.find((equation) => equation.defines === defines)?.expr ?? null;
}

function inputsOf(register: Register, text: string): readonly string[] {
  const result = parsedExpression(register, text);
  return result.ok ? result.expression.inputs : [];
}
