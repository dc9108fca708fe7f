import type { Plugin } from 'chart.js';
import { placeOf } from './chart-pen.ts';
import type { ChartTheme } from './chart-theme.ts';
import type { ComparisonScene } from './comparison-scene.ts';

const LINE = 1.5;
const HALF_CAP = 4;

/** Bars of ± k u behind the measured points: upright ones with caps, level ones without. */
export function errorBars(scene: ComparisonScene, theme: ChartTheme): Plugin {
  return {
    id: 'errorBars',
    beforeDatasetDraw(chart, { index }) {
      const series = scene.series[index];
      const place = placeOf(chart);
      if (!series || !place) return;
      const { pen } = place;
      pen.save();
      pen.strokeStyle = theme.water;
      pen.lineWidth = LINE;
      pen.beginPath();
      for (const point of series.points) {
        const x = place.x(point.x);
        const y = place.y(point.y);
        if (point.yBar !== null) {
          for (const end of [place.y(point.y + point.yBar), place.y(point.y - point.yBar)]) {
            pen.moveTo(x, y);
            pen.lineTo(x, end);
            pen.moveTo(x - HALF_CAP, end);
            pen.lineTo(x + HALF_CAP, end);
          }
        }
        if (point.xBar !== null) {
          pen.moveTo(Math.max(place.x(point.x - point.xBar), place.left), y);
          pen.lineTo(Math.min(place.x(point.x + point.xBar), place.right), y);
        }
      }
      pen.stroke();
      pen.restore();
    },
  };
}
