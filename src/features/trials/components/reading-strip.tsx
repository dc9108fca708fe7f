import type { SharedScale } from '../view/shared-scale.ts';
import type { GroupLines, TrialLine } from '../view/series-view.ts';

const percent = (share: number) => `${(share * 100).toFixed(3)}%`;

/** One row's reading on the shared scale, with the prediction running down through the rows of its setting. */
export function ReadingStrip({
  line,
  group,
  scale,
  k,
}: {
  readonly line: TrialLine;
  readonly group: GroupLines;
  readonly scale: SharedScale;
  readonly k: number;
}) {
  const { predicted } = group;
  return (
    <svg className="h-full w-full overflow-visible" aria-hidden="true">
      {scale.ticks.map(({ share, label }) => (
        <line key={label} x1={percent(share)} x2={percent(share)} y1="0" y2="100%" className="stroke-hair" />
      ))}
      {predicted && (
        <>
          {predicted.u !== null && (
            <rect
              x={percent(scale.share(predicted.value - k * predicted.u))}
              width={percent((2 * k * predicted.u) / (scale.high - scale.low))}
              y="0"
              height="100%"
              className="fill-predicted"
              opacity="0.13"
            />
          )}
          <line
            x1={percent(scale.share(predicted.value))}
            x2={percent(scale.share(predicted.value))}
            y1="0"
            y2="100%"
            className="stroke-predicted"
            strokeWidth="2"
          />
        </>
      )}
      {line.value !== null &&
        (line.trial.excluded ? (
          <ExcludedMark x={percent(scale.share(line.value))} />
        ) : (
          <MeasuredMark value={line.value} u={line.u} scale={scale} k={k} />
        ))}
    </svg>
  );
}

function MeasuredMark({
  value,
  u,
  scale,
  k,
}: {
  readonly value: number;
  readonly u: number | null;
  readonly scale: SharedScale;
  readonly k: number;
}) {
  const reach = k * (u ?? 0);
  const [low, high] = [percent(scale.share(value - reach)), percent(scale.share(value + reach))];
  return (
    <g className="stroke-measured" strokeWidth="1.5">
      {reach > 0 && (
        <>
          <line x1={low} x2={high} y1="50%" y2="50%" />
          <svg x={low} y="50%" overflow="visible">
            <line y1="-4" y2="4" />
          </svg>
          <svg x={high} y="50%" overflow="visible">
            <line y1="-4" y2="4" />
          </svg>
        </>
      )}
      <circle
        cx={percent(scale.share(value))}
        cy="50%"
        r="4"
        className="fill-measured stroke-paper"
        strokeWidth="1"
      />
    </g>
  );
}

/** Hollow with a cross: still in view, left out of every mean. */
function ExcludedMark({ x }: { readonly x: string }) {
  return (
    <svg x={x} y="50%" overflow="visible">
      <circle r="4.5" className="fill-paper stroke-ink-3" strokeWidth="1.25" />
      <path d="M-2.8-2.8 2.8 2.8M2.8-2.8-2.8 2.8" className="stroke-ink-3" strokeWidth="1.25" />
    </svg>
  );
}

/** Ticks of the shared scale, over the column. */
export function StripHead({ scale }: { readonly scale: SharedScale }) {
  return (
    <svg className="h-4.5 w-full overflow-visible" aria-hidden="true">
      {scale.ticks.map(({ share, label }) => (
        <svg key={label} x={percent(share)} overflow="visible">
          <text y="10" textAnchor="middle" className="fill-ink-3 text-2xs">
            {label}
          </text>
          <path d="M0 14v5" className="stroke-ink" />
        </svg>
      ))}
    </svg>
  );
}
