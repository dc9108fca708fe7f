/** What a symbol may mean: the values that a writer can tie, nearest to the sentence first. */
import type { Evidence, Quantity, ValueReference } from '#shared/evidence/evidence.ts';
import type { Findings, Hue } from '#shared/evidence/findings.ts';

/** One value that may be tied. */
export interface ValueOption {
  readonly key: string;
  readonly ref: ValueReference;
  /** "mean at 45°", "predicted at 45°", "largest, predicted", "short of the model at 45°". */
  readonly words: string;
  /** "44.8 ± 0.4 cm". */
  readonly text: string;
  readonly hue: Hue;
  readonly quantity: string | null;
}

/** The quantity that a typed symbol names ("theta" and "θ" are one), or null. */
export function quantityOfSymbol(_typed: string, _evidence: Evidence): Quantity | null {
  throw new Error('quantityOfSymbol: not written');
}

/** Every value that can be tied to one symbol, nearest to `contextText` (the sentence so far) first. */
export function optionsForSymbol(
  _symbol: string,
  _evidence: Evidence,
  _findings: Findings,
  _contextText: string,
): readonly ValueOption[] {
  throw new Error('optionsForSymbol: not written');
}
