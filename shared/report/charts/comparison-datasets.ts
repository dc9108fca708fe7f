import type { ChartTheme } from './chart-theme.ts';
import type { ComparisonDataset } from './comparison-chart-types.ts';
import type { ComparisonScene, CurveStretch } from './comparison-scene.ts';
import { residualsOf } from './residual-strip.ts';

/** Point forms of the first, second, third and fourth series; never a new hue. */
const POINT_FORMS = ['circle', 'rect', 'triangle', 'rectRot'] as const;
const BAND_ALPHA = '29';

/**
 * The datasets of a comparison. The measured series come first, so that their index is that of the scene's series;
 * then what is left out, the residuals, and the curve with its band. Earlier ones are drawn on top.
 */
export function comparisonDatasets(scene: ComparisonScene, theme: ChartTheme): ComparisonDataset[] {
  const curve = scene.curve.flatMap((stretch) => curveDatasets(stretch, theme));
  return [
    ...measuredDatasets(scene, theme),
    {
      type: 'scatter',
      yAxisID: 'y',
      label: 'excluded',
      data: scene.excluded.map(({ x, y, trial }) => ({ x, y, trial })),
      pointStyle: 'circle',
      pointRadius: 4,
      pointHoverRadius: 4,
      pointBorderWidth: 1.4,
      pointBorderColor: theme.ink3,
      pointBackgroundColor: '#00000000',
      clip: false,
    },
    residualDataset(scene, theme),
    ...curve,
  ];
}

function measuredDatasets(scene: ComparisonScene, theme: ChartTheme): ComparisonDataset[] {
  return scene.series.map((series, i) => {
    const form = POINT_FORMS[i % POINT_FORMS.length] ?? 'circle';
    return {
      type: 'scatter',
      yAxisID: 'y',
      label: `measured ${series.letter}`,
      data: series.points.map(({ x, y, point }) => ({ x, y, point })),
      pointStyle: form,
      pointRadius: form === 'circle' ? 4 : 5,
      pointHoverRadius: 5,
      pointBorderWidth: 1,
      pointBorderColor: theme.paper,
      pointBackgroundColor: theme.water,
      clip: false,
    };
  });
}

function residualDataset(scene: ComparisonScene, theme: ChartTheme): ComparisonDataset {
  const residuals = residualsOf(scene);
  return {
    type: 'bar',
    label: 'residuals',
    yAxisID: 'z',
    data: residuals.map(({ x, z, point }) => ({ x, y: z, point })),
    barThickness: 3,
    grouped: false,
    backgroundColor: residuals.map(({ z }) => (Math.abs(z) > scene.k ? theme.leak : theme.ink3)),
  };
}

function curveDatasets(stretch: CurveStretch, theme: ChartTheme): ComparisonDataset[] {
  const points = (side: number) =>
    stretch.x.map((x, i) => ({ x, y: (stretch.y[i] ?? 0) + side * (stretch.half[i] ?? 0) }));
  const line: ComparisonDataset = {
    type: 'line',
    yAxisID: 'y',
    label: stretch.trusted ? 'predicted' : 'predicted, outside trust',
    data: points(0),
    pointRadius: 0,
    pointHitRadius: 0,
    borderColor: theme.copper,
    borderWidth: 2,
    borderDash: stretch.trusted ? [] : [2, 3],
  };
  if (!stretch.trusted) return [line];
  const edge = { type: 'line' as const, yAxisID: 'y', pointRadius: 0, pointHitRadius: 0, borderWidth: 0 };
  return [
    line,
    { ...edge, label: 'band', data: points(1), fill: '+1', backgroundColor: theme.copper + BAND_ALPHA },
    { ...edge, label: 'band edge', data: points(-1) },
  ];
}
