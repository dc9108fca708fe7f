import type { Plugin } from 'chart.js';
import { placeOf } from './chart-pen.ts';
import type { ChartTheme } from './chart-theme.ts';
import type { ComparisonScene } from './comparison-scene.ts';

/** A dotted line from the largest predicted value down to its setting. */
export function largestMark(scene: ComparisonScene, theme: ChartTheme): Plugin {
  return {
    id: 'largestMark',
    beforeDatasetsDraw(chart) {
      const place = placeOf(chart);
      if (!place || !scene.largest) return;
      const { pen } = place;
      const x = place.x(scene.largest.x);
      pen.save();
      pen.strokeStyle = theme.copper;
      pen.lineWidth = 1.2;
      pen.setLineDash([2, 3]);
      pen.beginPath();
      pen.moveTo(x, place.y(scene.largest.y));
      pen.lineTo(x, place.plot.bottom);
      pen.stroke();
      pen.restore();
    },
  };
}
