import type { Plugin } from 'chart.js';
import { placeOf } from './chart-pen.ts';
import type { ChartTheme } from './chart-theme.ts';
import type { ComparisonScene } from './comparison-scene.ts';

const HALF_CROSS = 2.6;

/** The cross inside the hollow circle of a trial that is left out. */
export function excludedMarks(scene: ComparisonScene, theme: ChartTheme): Plugin {
  return {
    id: 'excludedMarks',
    afterDatasetsDraw(chart) {
      const place = placeOf(chart);
      if (!place || scene.excluded.length === 0) return;
      const { pen } = place;
      pen.save();
      pen.strokeStyle = theme.ink3;
      pen.lineWidth = 1.4;
      pen.beginPath();
      for (const mark of scene.excluded) {
        const x = place.x(mark.x);
        const y = place.y(mark.y);
        pen.moveTo(x - HALF_CROSS, y - HALF_CROSS);
        pen.lineTo(x + HALF_CROSS, y + HALF_CROSS);
        pen.moveTo(x + HALF_CROSS, y - HALF_CROSS);
        pen.lineTo(x - HALF_CROSS, y + HALF_CROSS);
      }
      pen.stroke();
      pen.restore();
    },
  };
}
