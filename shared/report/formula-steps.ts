/** An equation of a model in up to three steps: symbols, numbers put in, the result with its uncertainty. */
import type { Evidence, Reading } from '#shared/evidence/evidence.ts';
import type { Fault, Findings } from '#shared/evidence/findings.ts';

export type FormulaStepsShown = 'symbols' | 'numbers' | 'numbers and result';

/** Which equation, where. */
export interface EquationReference {
  readonly model: string;
  /** Quantity that the equation defines. */
  readonly defines: string;
  readonly series: string | null;
  readonly at: Readonly<Record<string, Reading>>;
}

/** LaTeX of each step; put-in numbers carry \htmlClass{fm} (measured) or \htmlClass{fp} (predicted, fitted). */
export type EquationSteps =
  | {
      readonly ok: true;
      readonly symbols: string;
      /** Second line: numbers put in, with the result when it was asked for; null: not asked for. */
      readonly numbers: string | null;
      readonly spoken: string;
    }
  | { readonly ok: false; readonly fault: Fault; readonly symbols: string | null };

export function equationSteps(
  _equation: EquationReference,
  _steps: FormulaStepsShown,
  _evidence: Evidence,
  _findings: Findings,
): EquationSteps {
  throw new Error('equationSteps: not written');
}
