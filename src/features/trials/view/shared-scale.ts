import type { GroupLines } from './series-view.ts';

/** The scale on which every reading of a series is drawn, in SI, with round ticks in the shown unit. */
export interface SharedScale {
  readonly low: number;
  readonly high: number;
  /** Share of the width, 0 at the left edge; may lie outside 0 to 1. */
  share(value: number): number;
  readonly ticks: readonly { readonly share: number; readonly label: string }[];
}

/** `toShown` gives a value's number in the shown unit. Null: nothing to draw. */
export function sharedScale(
  groups: readonly GroupLines[],
  k: number,
  toShown: (si: number) => number,
): SharedScale | null {
  const ends = groups.flatMap(({ lines, predicted }) => [
    ...lines.flatMap(({ value, u }) => (value === null ? [] : [value - k * (u ?? 0), value + k * (u ?? 0)])),
    ...(predicted
      ? [predicted.value - k * (predicted.u ?? 0), predicted.value + k * (predicted.u ?? 0)]
      : []),
  ]);
  const finite = ends.filter(Number.isFinite);
  if (finite.length === 0) return null;
  const [least, most] = [finite.reduce((a, b) => Math.min(a, b)), finite.reduce((a, b) => Math.max(a, b))];
  const air = (most - least || Math.abs(most) || 1) * 0.04;
  const [low, high] = [least - air, most + air];
  const share = (value: number) => (value - low) / (high - low);
  return { low, high, share, ticks: roundTicks(toShown(low), toShown(high)) };
}

/** Four to seven ticks at 1, 2 or 5 times a power of ten; `low` and `high` in the shown unit. */
function roundTicks(low: number, high: number): { share: number; label: string }[] {
  const rough = (high - low) / 5;
  const power = 10 ** Math.floor(Math.log10(rough));
  const step = [1, 2, 5, 10].map((times) => times * power).find((candidate) => candidate >= rough) ?? rough;
  const decimals = Math.max(0, -Math.floor(Math.log10(step) + 1e-9));
  const first = Math.ceil(low / step - 1e-9);
  const last = Math.floor(high / step + 1e-9);
  return Array.from({ length: Math.max(0, last - first + 1) }, (_, index) => {
    const value = (first + index) * step;
    return {
      share: (value - low) / (high - low),
      label: value
        .toFixed(decimals)
        .replace(/^-(?=.*[1-9])/, '\u2212')
        .replace(/^-/, ''),
    };
  });
}
