import type { Chart as DrawnChart } from 'chart.js';
import { useMemo, useState } from 'react';
import { Chart } from 'react-chartjs-2';
import type { Evidence } from '#shared/evidence/evidence.ts';
import type { ChartFinding, Findings } from '#shared/evidence/findings.ts';
import { chartHeight } from '#shared/report/charts/chart-height.ts';
import { comparisonChart } from '#shared/report/charts/comparison-chart.ts';
import { registerCharts } from '#shared/report/charts/register-charts.ts';
import { useTheme } from '#src/lib/preferences/use-theme.ts';
import { chartPoints, type ChartPoint } from './chart-points.ts';
import { PointButtons } from './point-buttons.tsx';
import { readChartTheme } from './read-chart-theme.ts';

registerCharts();

interface DrawnChartProps {
  readonly finding: ChartFinding;
  readonly evidence: Evidence;
  readonly findings: Findings;
  readonly width: number;
  readonly label: string;
  readonly onShow: (point: ChartPoint, button: HTMLElement, by: 'pointer' | 'focus' | 'press') => void;
  readonly onLeave: () => void;
}

/** The drawing itself; made anew whenever its finding, its width or the theme changes. */
export function DrawnComparison({
  finding,
  evidence,
  findings,
  width,
  label,
  onShow,
  onLeave,
}: DrawnChartProps) {
  const theme = useTheme();
  const height = chartHeight(width);
  const drawing = useMemo(
    () => ({
      key: `${theme} ${width} ${evidence.version}`,
      config: comparisonChart(finding, evidence, evidence.settings, readChartTheme(), { width, height }),
    }),
    [finding, evidence, theme, width, height],
  );
  const [points, setPoints] = useState<readonly ChartPoint[]>([]);
  const onDrawn = (chart: DrawnChart | null | undefined) => {
    if (chart) setPoints(chartPoints(chart, finding, evidence, findings));
  };
  return (
    <div className="relative" style={{ width, height }}>
      <Chart
        key={drawing.key}
        ref={(chart) => {
          // Reading positions waits for the first layout, which has happened when the reference is given.
          if (chart) queueMicrotask(() => onDrawn(chart as unknown as DrawnChart));
        }}
        type={drawing.config.type}
        data={drawing.config.data}
        {...(drawing.config.options ? { options: drawing.config.options } : {})}
        plugins={drawing.config.plugins ?? []}
        width={width}
        height={height}
        role="img"
        aria-label={label}
      />
      <PointButtons points={points} onShow={onShow} onLeave={onLeave} />
    </div>
  );
}
