import { CHART_FIGURE_SIZE, CHART_WORD_SIZE } from './axis-titles.ts';
import { horizontalAxis, residualAxis, verticalAxis, type ChartAxis } from './chart-axes.ts';
import type { ChartSize, ChartTheme } from './chart-theme.ts';
import type { ComparisonChart } from './comparison-chart-types.ts';
import type { ComparisonScene } from './comparison-scene.ts';
import { namedQuantityLabel } from './quantity-label.ts';
import { richTextWords } from './rich-text.ts';

/** Room above the plot for its axis' title, and below the strip for figures, in CSS pixels. */
export const TOP = 26;
const BOTTOM = 27;
/** Heights of the plot, the gap that holds the strip's title, and the strip. */
const WEIGHTS = { plot: 2.75, gap: 0.55, strip: 1.15 } as const;
const TITLE_CHARACTER = CHART_WORD_SIZE * 0.56;
const FIGURE_CHARACTER = CHART_FIGURE_SIZE * 0.58;

type Scales = NonNullable<NonNullable<ComparisonChart['options']>['scales']>;
type LinearScale = NonNullable<Scales[string]> & { readonly type: 'linear' };

/** The axes: settings along the bottom; on the left the plot above the residual strip, with a gap between. */
export function comparisonScales(scene: ComparisonScene, theme: ChartTheme, size: ChartSize): Scales {
  const inner = size.height - TOP - BOTTOM;
  const whole = WEIGHTS.plot + WEIGHTS.gap + WEIGHTS.strip;
  const y = verticalAxis(scene, (inner * WEIGHTS.plot) / whole);
  const z = residualAxis(scene, (inner * WEIGHTS.strip) / whole);
  const figures = [...y.ticks, ...z.ticks].map((tick) => tick.text.length);
  const left = Math.round(Math.max(...figures, 3) * FIGURE_CHARACTER + 14);
  const x = withoutTicksUnderTitle(
    horizontalAxis(scene, size.width - left),
    size.width - left,
    richTextWords(namedQuantityLabel(scene.x)).length * TITLE_CHARACTER + 12,
  );
  return {
    x: bottomScale(x, theme),
    z: stackedScale(z, theme, left, WEIGHTS.strip, false),
    gap: {
      ...stackedScale({ min: 0, max: 1, ticks: [] }, theme, left, WEIGHTS.gap, false),
    },
    y: stackedScale(y, theme, left, WEIGHTS.plot, true),
  };
}

/** A figure that would stand under the axis' title gives way to it; its tick stays. */
function withoutTicksUnderTitle(axis: ChartAxis, width: number, titleWidth: number): ChartAxis {
  const ticks = axis.ticks.map((tick) => {
    const x = ((tick.value - axis.min) / (axis.max - axis.min)) * width;
    const isUnderTitle = x + (tick.text.length * FIGURE_CHARACTER) / 2 > width - titleWidth;
    return isUnderTitle ? { ...tick, text: '' } : tick;
  });
  return { ...axis, ticks };
}

function textOf(axis: ChartAxis): (value: number | string) => string {
  return (value) => axis.ticks.find((tick) => tick.value === value)?.text ?? '';
}

function figures(theme: ChartTheme) {
  return { color: theme.ink3, font: { family: theme.uiFace, size: CHART_FIGURE_SIZE, weight: 400 } };
}

function fixedTicks(axis: ChartAxis) {
  return (scale: { ticks: { value: number }[] }) => {
    scale.ticks = axis.ticks.map(({ value }) => ({ value }));
  };
}

function bottomScale(axis: ChartAxis, theme: ChartTheme): LinearScale {
  return {
    type: 'linear',
    position: 'bottom',
    min: axis.min,
    max: axis.max,
    offset: false,
    border: { display: true, color: theme.ink, width: 1.25 },
    grid: {
      display: true,
      offset: false,
      drawOnChartArea: false,
      drawTicks: true,
      tickLength: 5,
      tickColor: theme.ink,
      tickWidth: 1.25,
    },
    ticks: { ...figures(theme), callback: textOf(axis), maxRotation: 0, autoSkip: false, padding: 4 },
    afterBuildTicks: fixedTicks(axis),
    afterFit: (scale: { height: number }) => {
      scale.height = BOTTOM;
    },
  };
}

function stackedScale(
  axis: ChartAxis,
  theme: ChartTheme,
  width: number,
  stackWeight: number,
  hairlines: boolean,
): LinearScale {
  return {
    type: 'linear',
    axis: 'y',
    position: 'left',
    stack: 'comparison',
    stackWeight,
    min: axis.min,
    max: axis.max,
    border: { display: false },
    grid: { display: hairlines, color: theme.hair, lineWidth: 1, drawTicks: false },
    ticks: { ...figures(theme), callback: textOf(axis), autoSkip: false, padding: 10 },
    afterBuildTicks: fixedTicks(axis),
    afterFit: (scale: { width: number }) => {
      scale.width = width;
    },
  };
}
