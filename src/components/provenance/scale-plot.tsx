import type { ProvenancePlot } from '#shared/report/provenance.ts';
import { linearTicks, tickText } from '#shared/report/charts/linear-ticks.ts';

const WIDTH = 332;
const AXIS = 31;

/** The trials behind a mean on one scale: the mean with ± u washed in, the excluded hollow, the prediction in copper. */
export function ScalePlot({ plot }: { readonly plot: ProvenancePlot }) {
  const { points, excluded, value, u, predicted } = plot;
  const half = u ?? 0;
  const all = [...points, ...excluded].map(({ x }) => x);
  const ends = [...all, value - half, value + half, ...(predicted === null ? [] : [predicted])];
  const [low, high] = [Math.min(...ends), Math.max(...ends)];
  const air = (high - low) * 0.08 || Math.abs(value) * 0.01 || 1;
  const [from, to] = [low - air, high + air];
  const place = (x: number) => 8 + ((x - from) / (to - from)) * (WIDTH - 16);
  const ticks = linearTicks(from, to, 5);
  return (
    <svg
      viewBox={`0 0 ${WIDTH} 50`}
      width="100%"
      aria-hidden="true"
      className="mt-3 overflow-visible font-ui text-2xs"
    >
      {u !== null && (
        <rect
          x={place(value - half)}
          width={Math.max(1, place(value + half) - place(value - half))}
          y="3"
          height={AXIS - 3}
          fill="var(--color-water-wash)"
        />
      )}
      <path d={`M2 ${AXIS}H${WIDTH - 2}`} stroke="var(--color-ink-3)" strokeWidth="1.25" />
      {ticks.values.map((tick) => (
        <g key={tick}>
          <path d={`M${place(tick)} ${AXIS}v5`} stroke="var(--color-ink-3)" strokeWidth="1.25" />
          <text x={place(tick)} y="48" textAnchor="middle" fill="var(--color-ink-3)">
            {tickText(tick, ticks.step)}
          </text>
        </g>
      ))}
      <path d={`M${place(value)} 1V${AXIS}`} stroke="var(--color-water)" strokeWidth="2" />
      {predicted !== null && (
        <path d={`M${place(predicted)} 1V${AXIS}`} stroke="var(--color-copper)" strokeWidth="2" />
      )}
      {points.map(({ trial, x }) => (
        <circle
          key={trial}
          cx={place(x)}
          cy="16"
          r="4"
          fill="var(--color-water)"
          stroke="var(--color-paper)"
        />
      ))}
      {excluded.map(({ trial, x }) => (
        <path
          key={trial}
          transform={`translate(${place(x)} 16)`}
          d="M-4.2 0a4.2 4.2 0 1 0 8.4 0a4.2 4.2 0 1 0-8.4 0M-2.2-2.2 2.2 2.2M2.2-2.2-2.2 2.2"
          fill="var(--color-paper)"
          stroke="var(--color-ink-3)"
          strokeWidth="1.4"
        />
      ))}
    </svg>
  );
}
