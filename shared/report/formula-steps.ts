/** An equation of a model in up to three steps: symbols, numbers put in, the result with its uncertainty. */
import { parsedExpression } from '#shared/evidence/compiled-expression.ts';
import type { Evidence, Reading, ValueReference } from '#shared/evidence/evidence.ts';
import { fault, isFault } from '#shared/evidence/fault.ts';
import { findValue } from '#shared/evidence/find-value.ts';
import type { Fault, Findings, Scalar } from '#shared/evidence/findings.ts';
import { registerOf, symbolName, type Register } from '#shared/evidence/register.ts';
import { expressionToLatex } from '#shared/expressions/expression-to-latex.ts';
import { scalarToLatex } from '#shared/formatting/scalar-latex.ts';
import { spokenScalar } from '#shared/formatting/spoken.ts';
import { symbolToLatex, symbolToSpeech } from '#shared/formatting/symbol.ts';

/** How far an equation is worked. */
export type FormulaStepsShown = 'symbols' | 'numbers' | 'numbers and result';

/** Which equation, and where its numbers are taken. */
export interface EquationReference {
  readonly model: string;
  /** Quantity that the equation defines. */
  readonly defines: string;
  /** Series whose held values count; null: only what the register has. */
  readonly series: string | null;
  /** What is set, by quantity. */
  readonly at: Readonly<Record<string, Reading>>;
}

/** LaTeX of the lines; put-in numbers carry \htmlClass{fm} (measured) or \htmlClass{fp} (predicted or fitted). */
export type EquationSteps =
  | {
      readonly ok: true;
      readonly symbols: string;
      /** Second line: numbers put in, with the result when it was asked for; null: not asked for. */
      readonly numbers: string | null;
      /** The equation's name, and its result where it is shown, in words. */
      readonly spoken: string;
    }
  /** The numbers cannot be put in; `symbols` is there unless the equation itself cannot be read. */
  | { readonly ok: false; readonly fault: Fault; readonly symbols: string | null };

/** Works an equation of a model as far as asked. */
export function equationSteps(
  equation: EquationReference,
  steps: FormulaStepsShown,
  evidence: Evidence,
  findings: Findings,
): EquationSteps {
  const register = registerOf(evidence);
  const found = findEquation(equation, register);
  if (typeof found !== 'string') return { ok: false, fault: found, symbols: null };
  const parsed = parsedExpression(register, found);
  if (!parsed.ok) {
    const { code, sentence, span } = parsed.fault;
    return { ok: false, fault: fault(code, sentence, equation.model, span), symbols: null };
  }
  const symbol = (id: string) => symbolToLatex(register.quantities.get(id)?.symbol ?? '?');
  const left = symbol(equation.defines);
  const symbols = `${left} = ${expressionToLatex(parsed.expression, { symbol })}`;
  const name = symbolToSpeech(register.quantities.get(equation.defines)?.symbol ?? '');
  if (steps === 'symbols') return { ok: true, symbols, numbers: null, spoken: `Formula for ${name}` };

  const inputs = new Map<string, Scalar>();
  for (const id of parsed.expression.inputs) {
    const value = inputValue(id, equation, evidence, findings);
    if (isFault(value)) return { ok: false, fault: value, symbols };
    inputs.set(id, value);
  }
  const put = (id: string) => putIn(id, inputs, evidence);
  const numbers = `${left} = ${expressionToLatex(parsed.expression, { symbol, put })}`;
  if (steps === 'numbers')
    return { ok: true, symbols, numbers, spoken: `Formula for ${name} with its numbers` };

  const result = findValue(findings, evidence, definedBy(equation.defines, equation, register));
  if (isFault(result)) return { ok: false, fault: result, symbols };
  const rule = evidence.settings.rounding;
  const latex = scalarToLatex(result, result.unit, rule, 'value and uncertainty');
  return {
    ok: true,
    symbols,
    numbers: `${numbers} = \\htmlClass{fp}{${latex}}`,
    spoken: `Formula for ${name}: ${spokenScalar(result, result.unit, rule)}`,
  };
}

function findEquation({ model, defines }: EquationReference, register: Register): string | Fault {
  const row = register.models.get(model);
  if (row === undefined) {
    return fault(
      'source gone',
      'The model of this formula is gone. Choose another equation, or type the formula.',
      model,
    );
  }
  const expr = row.equations.find((one) => one.defines === defines)?.expr;
  return (
    expr ??
    fault(
      'source gone',
      `Model ${row.n} has no equation for ${symbolName(register, defines)} any more. Choose another equation.`,
      model,
    )
  );
}

/** What an input stands for at this place: what is set there, else what the model or the register says. */
function inputValue(
  id: string,
  equation: EquationReference,
  evidence: Evidence,
  findings: Findings,
): Scalar | Fault {
  const register = registerOf(evidence);
  const { series, at } = equation;
  if (id in at && series !== null) {
    const set = findValue(findings, evidence, { kind: 'mean', quantity: id, series, at });
    if (!isFault(set)) return set;
  }
  return findValue(findings, evidence, definedBy(id, equation, register));
}

function definedBy(id: string, { model, series, at }: EquationReference, register: Register): ValueReference {
  const defines = register.models.get(model)?.equations.some((one) => one.defines === id) ?? false;
  if (defines && series !== null) return { kind: 'prediction', model, quantity: id, series, at: { ...at } };
  return series === null ? { kind: 'quantity', quantity: id } : { kind: 'quantity', quantity: id, series };
}

function putIn(id: string, inputs: ReadonlyMap<string, Scalar>, evidence: Evidence): string | null {
  const value = inputs.get(id);
  if (value === undefined) return null;
  const latex = scalarToLatex(value, value.unit, evidence.settings.rounding, 'value');
  return `\\htmlClass{${value.hue === 'measured' ? 'fm' : 'fp'}}{${latex}}`;
}
