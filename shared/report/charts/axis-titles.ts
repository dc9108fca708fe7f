import type { Plugin } from 'chart.js';
import { placeOf } from './chart-pen.ts';
import type { ChartTheme } from './chart-theme.ts';
import type { ComparisonScene } from './comparison-scene.ts';
import { namedQuantityLabel, quantityLabel } from './quantity-label.ts';
import { drawRichText, plain, type LabelStyle, type TextRun } from './rich-text.ts';

/** Size of words on a chart, in CSS pixels. */
export const CHART_WORD_SIZE = 13;
/** Size of an axis' figures. */
export const CHART_FIGURE_SIZE = 12;
/** Baseline of the figures below the bottom line. */
export const FIGURE_BASELINE = 20;

/** Titles at the ends of the axes: above the left ones, at the right end of the bottom one. */
export function axisTitles(scene: ComparisonScene, theme: ChartTheme): Plugin {
  const style: LabelStyle = { size: CHART_WORD_SIZE, colour: theme.ink2 };
  return {
    id: 'axisTitles',
    afterDraw(chart) {
      const place = placeOf(chart);
      if (!place) return;
      const { pen, left, right, plot, strip } = place;
      drawRichText(pen, quantityLabel(scene.y), { x: left, y: plot.top - 9, align: 'left' }, style, theme);
      drawRichText(pen, residualTitle(scene), { x: left, y: strip.top - 7, align: 'left' }, style, theme);
      drawRichText(
        pen,
        namedQuantityLabel(scene.x),
        { x: right, y: strip.bottom + FIGURE_BASELINE, align: 'right' },
        style,
        theme,
      );
    },
  };
}

/** "z = (measured − predicted) / u", or fitted where the model was fitted to these trials. */
export function residualTitle(scene: ComparisonScene): TextRun[] {
  return [
    { text: 'z', style: 'symbol' },
    plain(` = (measured − ${scene.fitted ? 'fitted' : 'predicted'}) / `),
    { text: 'u', style: 'symbol' },
  ];
}
