import type { ComparisonScene } from './comparison-scene.ts';
import { linearTicks, tickText } from './linear-ticks.ts';

/** One axis: its ends and its ticks with their words. */
export interface ChartAxis {
  readonly min: number;
  readonly max: number;
  readonly ticks: readonly { readonly value: number; readonly text: string }[];
}

const AIR_Y = 0.08;
const AIR_X = 0.035;
/** The strip's lowest figure stands clear of the bottom line. */
const AIR_Z_BELOW = 0.35;
const AIR_Z_ABOVE = 0.05;
/** Least distance of two tick figures, in CSS pixels. */
const TICK_GAP_Y = 12;

function extent(values: readonly number[]): [number, number] {
  let low = Infinity;
  let high = -Infinity;
  for (const value of values) {
    if (!Number.isFinite(value)) continue;
    low = Math.min(low, value);
    high = Math.max(high, value);
  }
  if (low > high) return [0, 1];
  if (low === high) {
    const half = Math.abs(low) * 0.1 || 1;
    return [low - half, high + half];
  }
  return [low, high];
}

function withAir([low, high]: [number, number], share: number): [number, number] {
  const air = (high - low) * share;
  return [low - air, high + air];
}

function axis([min, max]: [number, number], count: number): ChartAxis {
  const { step, values } = linearTicks(min, max, count);
  return { min, max, ticks: values.map((value) => ({ value, text: tickText(value, step) })) };
}

/** The horizontal axis; a little air at both ends keeps the outer points whole. */
export function horizontalAxis(scene: ComparisonScene, width: number): ChartAxis {
  const values = [
    ...scene.series.flatMap((series) => series.points.map((point) => point.x)),
    ...scene.excluded.map((point) => point.x),
    ...scene.curve.flatMap((stretch) => stretch.x),
  ];
  return axis(withAir(extent(values), AIR_X), Math.max(2, Math.min(7, width / 85)));
}

/** The vertical axis: everything drawn, with 8 % air; the curve outside trust does not widen it. */
export function verticalAxis(scene: ComparisonScene, height: number): ChartAxis {
  const measured = scene.series.flatMap((series) =>
    series.points.flatMap((point) => [point.y - (point.yBar ?? 0), point.y + (point.yBar ?? 0)]),
  );
  const trusted = scene.curve.some((stretch) => stretch.trusted);
  const curve = scene.curve
    .filter((stretch) => stretch.trusted || !trusted)
    .flatMap((stretch) =>
      stretch.y.flatMap((y, i) => [y - (stretch.half[i] ?? 0), y + (stretch.half[i] ?? 0)]),
    );
  const values = [...measured, ...scene.excluded.map((point) => point.y), ...curve];
  return axis(withAir(extent(values), AIR_Y), Math.max(2, Math.min(5, height / 34)));
}

/** The residual strip, the same above and below nought: at least to 2 k, with figures at nought, k and the ends. */
export function residualAxis(scene: ComparisonScene, height: number): ChartAxis {
  const largest = Math.max(
    0,
    ...scene.series.flatMap((series) => series.points.map((point) => Math.abs(point.z ?? 0))),
  );
  const end = Math.max(2 * scene.k, Math.ceil((largest * 1.1) / 2) * 2);
  const half = height / 2;
  const showsK = (half * scene.k) / end >= TICK_GAP_Y && half * (1 - scene.k / end) >= TICK_GAP_Y * 0.9;
  const values = showsK ? [-end, -scene.k, 0, scene.k, end] : [-end, 0, end];
  return {
    min: -end * (1 + AIR_Z_BELOW),
    max: end * (1 + AIR_Z_ABOVE),
    ticks: values.map((value) => ({ value, text: tickText(value, Number.isInteger(value) ? 1 : 0.1, true) })),
  };
}
