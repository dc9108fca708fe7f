import type { Plugin } from 'chart.js';
import { placeOf, type ChartPlace } from './chart-pen.ts';
import type { ChartTheme } from './chart-theme.ts';
import type { ComparisonScene, MeasuredPoint } from './comparison-scene.ts';
import { tickText } from './linear-ticks.ts';
import { drawRichText, plain, richTextWidth, type LabelStyle } from './rich-text.ts';

const DOT_RADIUS = 2.6;
const HEAD_LENGTH = 8;
const HEAD_HALF_WIDTH = 4.5;
const FIGURE_SIZE = 12;

type Residual = MeasuredPoint & { readonly z: number };

/** Every residual of the chart, in the order of its bars. */
export function residualsOf(scene: ComparisonScene): Residual[] {
  return scene.series.flatMap((series) =>
    series.points.flatMap((point) => (point.z === null ? [] : [{ ...point, z: point.z }])),
  );
}

/**
 * The residual strip besides its bars: the zone ± k, the zero line, a dot on what stays within, an arrow head and the
 * figure on what goes beyond. The narrow form has one figure, at the worst.
 *
 * @param barIndex - index of the dataset that holds the stems
 */
export function residualStrip(
  scene: ComparisonScene,
  theme: ChartTheme,
  narrow: boolean,
  barIndex: number,
): Plugin {
  const residuals = residualsOf(scene);
  const isBeyond = (residual: Residual) => Math.abs(residual.z) > scene.k;
  return {
    id: 'residualStrip',
    beforeDatasetsDraw(chart) {
      const place = placeOf(chart);
      if (!place) return;
      drawZone(place, scene.k, theme);
      // A stem ends where its arrow head begins, so that the head's tip stands at the value.
      chart.getDatasetMeta(barIndex).data.forEach((bar, i) => {
        const residual = residuals[i];
        if (residual && isBeyond(residual)) {
          bar.y = place.z(residual.z) + Math.sign(residual.z) * (HEAD_LENGTH - 1);
        }
      });
    },
    afterDatasetsDraw(chart) {
      const place = placeOf(chart);
      if (!place) return;
      for (const residual of residuals) {
        if (isBeyond(residual)) drawHead(place, residual, theme);
        else drawDot(place, residual, theme);
      }
      drawFigures(place, residuals.filter(isBeyond), residuals, theme, narrow);
    },
  };
}

function drawZone(place: ChartPlace, k: number, theme: ChartTheme): void {
  const { pen } = place;
  pen.save();
  pen.fillStyle = `${theme.ink}0d`;
  const top = place.z(k);
  pen.fillRect(place.left, top, place.right - place.left, place.z(-k) - top);
  pen.strokeStyle = theme.copper;
  pen.lineWidth = 1.5;
  pen.beginPath();
  pen.moveTo(place.left, place.z(0));
  pen.lineTo(place.right, place.z(0));
  pen.stroke();
  pen.restore();
}

function drawDot(place: ChartPlace, residual: Residual, theme: ChartTheme): void {
  const { pen } = place;
  pen.fillStyle = theme.ink3;
  pen.beginPath();
  pen.arc(place.x(residual.x), place.z(residual.z), DOT_RADIUS, 0, 2 * Math.PI);
  pen.fill();
}

function drawHead(place: ChartPlace, residual: Residual, theme: ChartTheme): void {
  const { pen } = place;
  const x = place.x(residual.x);
  const tip = place.z(residual.z);
  const back = tip + Math.sign(residual.z) * HEAD_LENGTH;
  pen.fillStyle = theme.leak;
  pen.beginPath();
  pen.moveTo(x - HEAD_HALF_WIDTH, back);
  pen.lineTo(x + HEAD_HALF_WIDTH, back);
  pen.lineTo(x, tip);
  pen.closePath();
  pen.fill();
}

/** Figures from the worst down; one that would run into a stem or another figure is left to the table. */
function drawFigures(
  place: ChartPlace,
  beyond: readonly Residual[],
  all: readonly Residual[],
  theme: ChartTheme,
  narrow: boolean,
): void {
  const style: LabelStyle = { size: FIGURE_SIZE, colour: theme.leak, weight: 600 };
  const worstFirst = beyond.toSorted((a, b) => Math.abs(b.z) - Math.abs(a.z));
  const taken: [number, number][] = all.map(({ x }) => [place.x(x) - 3, place.x(x) + 3]);
  for (const residual of narrow ? worstFirst.slice(0, 1) : worstFirst) {
    const runs = [plain(tickText(Number(residual.z.toFixed(1)), 0.1, true))];
    const width = richTextWidth(place.pen, runs, style, theme);
    const x = place.x(residual.x);
    const y = place.z(residual.z) + (residual.z < 0 ? 0 : FIGURE_SIZE * 0.72);
    const free = [
      { align: 'left' as const, from: x + 8, to: x + 8 + width },
      { align: 'right' as const, from: x - 8 - width, to: x - 8 },
    ].find(
      ({ from, to }) =>
        from >= place.left &&
        to <= place.right + 4 &&
        !taken.some(([left, right]) => from < right && to > left),
    );
    if (!free) continue;
    taken.push([free.from, free.to]);
    drawRichText(
      place.pen,
      runs,
      { x: free.align === 'left' ? free.from : free.to, y, align: free.align },
      style,
      theme,
    );
  }
}
