import { lazy, Suspense, useState } from 'react';
import type { Chart, ValueReference } from '#shared/evidence/evidence.ts';
import type { ChartFinding } from '#shared/evidence/findings.ts';
import { chartHeight } from '#shared/report/charts/chart-height.ts';
import { chartSentence } from '#shared/report/charts/chart-sentence.ts';
import { Word } from '#src/components/word.tsx';
import { useFindingsSnapshot } from '#src/lib/evidence/use-evidence.ts';
import { useWidth } from '#src/lib/use-width.ts';
import { ChartAsTable } from './chart-as-table.tsx';
import { PointCard, usePointCard } from './point-card.tsx';

const DrawnComparison = lazy(async () => ({ default: (await import('./drawn-chart.tsx')).DrawnComparison }));

export interface ComparisonChartViewProps {
  readonly chart: Chart;
  /** Without a fault. */
  readonly finding: ChartFinding;
  /** Opens a point's provenance elsewhere; without it the card opens beside the point. */
  readonly onOpenPoint?:
    ((reference: ValueReference, button: HTMLElement, takesFocus: boolean) => void) | undefined;
}

/** A comparison drawn in our chart language, or as a table; its points open their provenance. */
export function ComparisonChartView({ chart, finding, onOpenPoint }: ComparisonChartViewProps) {
  const { evidence, findings } = useFindingsSnapshot();
  const [frame, width] = useWidth(0);
  const [isTable, setIsTable] = useState(false);
  const card = usePointCard();
  const label = chartSentence(chart, finding);
  return (
    <div ref={frame} className="relative min-w-0">
      {isTable ? (
        <ChartAsTable finding={finding} evidence={evidence} caption={label} />
      ) : (
        <div style={{ minHeight: chartHeight(width) }}>
          {width > 0 && (
            <Suspense>
              <DrawnComparison
                finding={finding}
                evidence={evidence}
                findings={findings}
                width={width}
                label={label}
                onLeave={card.leave}
                onShow={(point, button, by) => {
                  if (!onOpenPoint) card.show(point, button, by);
                  else if (by !== 'pointer' || button === document.activeElement)
                    onOpenPoint(point.reference, button, by === 'press');
                }}
              />
            </Suspense>
          )}
        </div>
      )}
      {card.open && <PointCard card={card} width={width} />}
      <div className="my-1 text-right text-xs">
        <Word className="min-h-6" onClick={() => setIsTable(!isTable)}>
          {isTable ? 'See as chart' : 'See as table'}
        </Word>
      </div>
    </div>
  );
}
