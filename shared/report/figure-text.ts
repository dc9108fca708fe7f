import type { FitFigure, ValueReference } from '#shared/evidence/evidence.ts';
import type { Scalar } from '#shared/evidence/findings.ts';

/** References whose value is a bare figure without a unit or an uncertainty of its own. */
export type FigureReference =
  | Extract<ValueReference, { kind: 'fit' | 'count' }>
  | { readonly kind: 'claim'; readonly claim: string; readonly figure: 'z' | 'difference' | 'k' };

/**
 * Whether a reference points at such a figure: of a fit, of a verdict, or a count. The difference a claim rests on is
 * a measured value like any other.
 *
 * @example isFigure({ kind: 'count', of: 'kept', series: 's1' }) // => true
 * @example isFigure({ kind: 'claim', claim: 'c1', figure: 'difference' }) // => false
 */
export function isFigure(ref: ValueReference): ref is FigureReference {
  if (ref.kind === 'claim') return ref.figure !== 'difference';
  return ref.kind === 'fit' || ref.kind === 'count';
}

interface FigureStyle {
  readonly sign: string;
  readonly words: string;
  /** Decimals, or significant figures. */
  readonly decimals?: number;
  readonly figures?: number;
}

const FIT: Record<FitFigure, FigureStyle> = {
  'chi-squared': { sign: 'χ²', words: 'chi squared', figures: 2 },
  'degrees of freedom': { sign: 'ν', words: 'degrees of freedom', decimals: 0 },
  'p-value': { sign: 'p', words: 'p value', figures: 2 },
  'reduced chi-squared': { sign: 'χ²/ν', words: 'chi squared per degree of freedom', figures: 2 },
  AICc: { sign: 'AICc', words: 'A I C c', decimals: 1 },
  'worst z': { sign: 'z', words: 'worst difference, in u', decimals: 1 },
};
const CLAIM = {
  z: { sign: 'z', words: 'difference in u', decimals: 1 },
  k: { sign: 'k', words: 'margin in u', figures: 2 },
  difference: { sign: '', words: '', figures: 2 },
} satisfies Record<string, FigureStyle>;

/**
 * A figure as it stands in a sentence: `3.8`, `χ² = 3.8`, or, to be spoken, `chi squared 3.8`.
 *
 * @param scalar - the figure's value
 * @param form - a form of live values, or 'spoken'
 */
export function figureText(ref: FigureReference, scalar: Pick<Scalar, 'value'>, form: string): string {
  if (ref.kind === 'count') return countText(ref.of, scalar.value, form);
  const style: FigureStyle = ref.kind === 'fit' ? FIT[ref.figure] : CLAIM[ref.figure];
  const number = write(scalar.value, style);
  if (form === 'spoken') return `${style.words} ${number.replace('−', 'minus ')}`;
  return form === 'symbol and value' ? `${style.sign}\u00A0=\u00A0${number}` : number;
}

function countText(of: 'trials' | 'kept' | 'excluded' | 'used', count: number, form: string): string {
  const noun = count === 1 ? 'trial' : 'trials';
  if (form === 'number' || form === 'concise') return String(count);
  if (form !== 'spoken') return `${count}\u00A0${noun}`;
  return of === 'trials' ? `${count} ${noun}` : `${count} ${noun} ${of}`;
}

function write(value: number, { decimals, figures }: FigureStyle): string {
  if (!Number.isFinite(value)) return 'not a number';
  const places = decimals ?? placesFor(value, figures ?? 2);
  return value.toFixed(places).replace('-', '−');
}

/** Decimals that show a number with at least so many figures, whole numbers in full. */
function placesFor(value: number, figures: number): number {
  if (value === 0) return 0;
  if (Number.isInteger(value) && Math.abs(value) < 1000) return 0;
  return Math.min(12, Math.max(0, figures - 1 - Math.floor(Math.log10(Math.abs(value)))));
}
