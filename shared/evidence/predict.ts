import type { Evidence, Reading } from './evidence.ts';
import type { Fault, Findings, Scalar } from './findings.ts';

/** Where a model is asked: a setting of a series that need not have been logged yet. */
export interface PredictionPoint {
  readonly model: string;
  /** Quantity to predict: one that the model defines. */
  readonly quantity: string;
  readonly series: string;
  /** What is set, by quantity; what the series holds need not be repeated. */
  readonly values: Readonly<Record<string, Reading>>;
}

/** What a model predicts at a setting, with the uncertainty of the setting itself and of everything it is made from. */
export function predictAt(_evidence: Evidence, _findings: Findings, _point: PredictionPoint): Scalar | Fault {
  throw new Error('predictAt: body follows');
}
