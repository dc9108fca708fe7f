import type { Plugin } from 'chart.js';
import { unitToText } from '#shared/formatting/unit-text.ts';
import { CHART_WORD_SIZE } from './axis-titles.ts';
import { placeOf, type ChartPlace } from './chart-pen.ts';
import type { ChartTheme } from './chart-theme.ts';
import type { ComparisonScene } from './comparison-scene.ts';
import { placeLabel, type Box, type LabelCandidate } from './label-placer.ts';
import { tickText } from './linear-ticks.ts';
import { symbolRuns } from './quantity-label.ts';
import { drawRichText, plain, richTextWidth, type LabelStyle, type TextRun } from './rich-text.ts';

const ASCENT = 10;
const TITLE_WIDTH = 70;
const DESCENT = 3.5;
/** More labels of excluded trials than this make a thicket; the table names them all. */
const MOST_EXCLUDED_LABELS = 4;

/**
 * Labels at the curves, in the hue of what they name, where they run over nothing: the largest value, the trials left
 * out, the predicted curve, each measured series.
 */
export function curveLabels(scene: ComparisonScene, theme: ChartTheme): Plugin {
  return {
    id: 'curveLabels',
    afterDatasetsDraw(chart) {
      const place = placeOf(chart);
      if (!place) return;
      const taken = obstacles(scene, place);
      for (const label of labelsOf(scene, theme, place)) {
        const width = richTextWidth(place.pen, label.runs, label.style, theme);
        const bounds = {
          left: place.left,
          right: place.right + 4,
          top: place.plot.top - 20,
          bottom: place.plot.bottom,
        };
        const box = placeLabel(label.candidates(width), taken, bounds);
        if (!box) continue;
        taken.push(box);
        const at = { x: box.left, y: box.bottom - DESCENT, align: 'left' as const };
        drawRichText(place.pen, label.runs, at, label.style, theme);
      }
    },
  };
}

interface CurveLabel {
  readonly runs: readonly TextRun[];
  readonly style: LabelStyle;
  readonly candidates: (width: number) => LabelCandidate[];
}

function labelsOf(scene: ComparisonScene, theme: ChartTheme, place: ChartPlace): CurveLabel[] {
  const word = (colour: string): LabelStyle => ({ size: CHART_WORD_SIZE, colour });
  const labels: CurveLabel[] = [];
  if (scene.largest) {
    labels.push({
      runs: largestRuns(scene, scene.largest.x),
      style: word(theme.copper),
      candidates: aboveLargest(scene, place),
    });
  }
  for (const mark of scene.excluded.slice(0, MOST_EXCLUDED_LABELS)) {
    labels.push({
      runs: [plain(`${mark.name} excluded`)],
      style: word(theme.ink3),
      candidates: (width) => besidePoint(place.x(mark.x), place.y(mark.y), width, 9),
    });
  }
  if (scene.curve.length > 0) {
    labels.push({
      runs: [plain(scene.fitted ? 'fitted, ± ' : 'predicted, ± '), ...kTimesU(scene.k)],
      style: word(theme.copper),
      candidates: alongCurve(scene, place),
    });
  }
  scene.series.forEach((series, nth) => {
    labels.push({
      runs: nth === 0 ? firstSeriesRuns(scene, series.letter) : [plain(`series ${series.letter}`)],
      style: word(theme.water),
      candidates: (width) =>
        series.points.flatMap((point, i) =>
          besidePoint(place.x(point.x), place.y(point.y), width, 14).map(({ box, cost }) => ({
            box,
            cost: cost + 2 * Math.abs(i - (series.points.length - 1) / 3),
          })),
        ),
    });
  });
  return labels;
}

/** The first series' label says how points and bars are to be read; further ones need only their name. */
function firstSeriesRuns(scene: ComparisonScene, letter: string): TextRun[] {
  const which = scene.series.length > 1 ? `, series ${letter}` : '';
  return [plain(`measured${which}${scene.means ? ', mean ± ' : ', ± '}`), ...kTimesU(scene.k)];
}

function kTimesU(k: number): TextRun[] {
  return [plain(k === 1 ? '' : tickText(k, Number.isInteger(k) ? 1 : 0.1)), { text: 'u', style: 'symbol' }];
}

/** "θ* = 38.0°": the setting at which the prediction is largest, to three figures. */
function largestRuns(scene: ComparisonScene, x: number): TextRun[] {
  const unit = scene.x.unit === '1' ? '' : unitToText(scene.x.unit);
  const figures = x === 0 ? '0' : tickText(x, 10 ** (Math.floor(Math.log10(Math.abs(x))) - 2));
  return [...symbolRuns(scene.x.symbol), plain(`* = ${figures}${unit === '°' ? '' : ' '}${unit}`)];
}

function boxAt(left: number, baseline: number, width: number): Box {
  return { left, right: left + width, top: baseline - ASCENT, bottom: baseline + DESCENT };
}

function aboveLargest(scene: ComparisonScene, place: ChartPlace): (width: number) => LabelCandidate[] {
  const largest = scene.largest;
  if (!largest) return () => [];
  const stretch = scene.curve.find((one) => one.trusted);
  const half = Math.max(0, ...(stretch?.half ?? []));
  const x = place.x(largest.x);
  return (width) =>
    [5, 9, 14].map((rise) => ({
      box: boxAt(x - width / 2, place.y(largest.y + half) - rise - DESCENT, width),
      cost: rise,
    }));
}

function besidePoint(x: number, y: number, width: number, gap: number): LabelCandidate[] {
  return [
    { box: boxAt(x + gap, y + ASCENT + 2, width), cost: 0 },
    { box: boxAt(x - gap - width, y + ASCENT + 2, width), cost: 1 },
    { box: boxAt(x + gap, y + 4, width), cost: 2 },
    { box: boxAt(x - gap - width, y + 4, width), cost: 3 },
    { box: boxAt(x - width / 2, y + ASCENT + gap + 4, width), cost: 4 },
    { box: boxAt(x - width / 2, y - gap - DESCENT - 2, width), cost: 5 },
    { box: boxAt(x + gap, y + ASCENT + gap, width), cost: 6 },
    { box: boxAt(x + gap, y - gap - DESCENT, width), cost: 6 },
    { box: boxAt(x - width / 2, y + ASCENT + 2 * gap, width), cost: 7 },
    { box: boxAt(x - width / 2, y - 2 * gap - DESCENT, width), cost: 7 },
    { box: boxAt(x - 6, y - 2 * gap, width), cost: 8 },
    { box: boxAt(x - 6, y - 3 * gap, width), cost: 9 },
  ];
}

/** Above and below the curve at several places; a third of the way along is liked best. */
function alongCurve(scene: ComparisonScene, place: ChartPlace): (width: number) => LabelCandidate[] {
  const stretch = scene.curve.find((one) => one.trusted) ?? scene.curve[0];
  if (!stretch) return () => [];
  const n = stretch.x.length;
  return (width) => {
    const candidates: LabelCandidate[] = [];
    for (let share = 0.1; share < 0.95; share += 0.05) {
      const i = Math.round(share * (n - 1));
      const x = place.x(stretch.x[i] ?? 0);
      const top = place.y((stretch.y[i] ?? 0) + (stretch.half[i] ?? 0));
      const bottom = place.y((stretch.y[i] ?? 0) - (stretch.half[i] ?? 0));
      const cost = 20 * Math.abs(share - 0.3);
      for (const left of [x - width - 8, x - width / 2, x + 8]) {
        candidates.push({ box: boxAt(left, top - 6 - DESCENT, width), cost });
        candidates.push({ box: boxAt(left, bottom + 6 + ASCENT, width), cost: cost + 3 });
      }
    }
    return candidates;
  };
}

/** What labels must keep clear of: the band in narrow slices, the points with their bars, the dotted line. */
function obstacles(scene: ComparisonScene, place: ChartPlace): Box[] {
  const { left, plot } = place;
  // The title of the vertical axis.
  const boxes: Box[] = [{ left, right: left + TITLE_WIDTH, top: plot.top - 26, bottom: plot.top - 4 }];
  for (const stretch of scene.curve) {
    for (let i = 1; i < stretch.x.length; i++) {
      const ends = [i - 1, i].map((j) => {
        const y = stretch.y[j] ?? 0;
        const half = stretch.half[j] ?? 0;
        return { x: place.x(stretch.x[j] ?? 0), top: place.y(y + half), bottom: place.y(y - half) };
      });
      boxes.push({
        left: Math.min(...ends.map((end) => end.x)),
        right: Math.max(...ends.map((end) => end.x)),
        top: Math.min(...ends.map((end) => end.top)) - 3,
        bottom: Math.max(...ends.map((end) => end.bottom)) + 3,
      });
    }
  }
  for (const point of scene.series.flatMap((series) => series.points)) {
    const x = place.x(point.x);
    const halfX = Math.max(6, point.xBar === null ? 0 : place.x(point.x + point.xBar) - x);
    boxes.push({
      left: x - halfX,
      right: x + halfX,
      top: Math.min(place.y(point.y + (point.yBar ?? 0)), place.y(point.y) - 6),
      bottom: Math.max(place.y(point.y - (point.yBar ?? 0)), place.y(point.y) + 6),
    });
  }
  for (const mark of scene.excluded) {
    const [x, y] = [place.x(mark.x), place.y(mark.y)];
    boxes.push({ left: x - 6, right: x + 6, top: y - 6, bottom: y + 6 });
  }
  if (scene.largest) {
    const x = place.x(scene.largest.x);
    boxes.push({ left: x - 2, right: x + 2, top: place.y(scene.largest.y), bottom: place.plot.bottom });
  }
  return boxes;
}
