import { useMemo } from 'react';
import { pathOf } from './can.ts';
import { drawSpout, type SpoutDrawing } from './spout-drawing.ts';

const TABLE = 716;
/** Half the length of a reading's bars. */
const BAR = 11;
const thin = { fill: 'none', stroke: 'var(--color-ink-2)', strokeWidth: 1.2 } as const;
const LETTER = 'fill-ink font-report text-[24px] italic';

interface PartProps {
  readonly drawing: SpoutDrawing;
}

function SetUp({ drawing: { can, lean } }: PartProps) {
  const [cornerX, cornerY] = can.corner;
  return (
    <>
      <path d={`${pathOf(can.water)}Z`} fill="var(--color-water-fill)" opacity=".7" />
      <path d={pathOf(can.surface)} stroke="var(--color-water)" strokeWidth="2.4" />
      <path
        d={can.walls.map(pathOf).join('')}
        fill="none"
        stroke="var(--color-ink)"
        strokeWidth="2.6"
        strokeLinecap="round"
        strokeLinejoin="round"
      />
      <path
        d={`${pathOf(can.wedge)}Z`}
        fill="var(--color-paper)"
        stroke="var(--color-ink)"
        strokeWidth="1.8"
        strokeLinejoin="round"
      />
      <path
        d={`M${cornerX + 62} ${cornerY}A62 62 0 0 0 ${cornerX + 62 * Math.cos(lean)} ${cornerY - 62 * Math.sin(lean)}`}
        {...thin}
      />
      <text x={cornerX + 70} y={cornerY - 10} className={LETTER}>
        θ
      </text>
    </>
  );
}

function Measures({ drawing: { can, spout } }: PartProps) {
  const [spoutX, spoutY] = spout;
  const [surfaceX, surfaceY] = can.surface[1];
  const head = spoutX + 13;
  const height = spoutX + 88;
  return (
    <>
      <path
        d={`M${head} ${surfaceY}V${spoutY - 2}M${head - 6} ${surfaceY}h12M${head - 6} ${spoutY - 2}h12M${height} ${spoutY}V${TABLE}M${height - 6} ${spoutY}h12`}
        {...thin}
      />
      <path d={`M${surfaceX + 10} ${surfaceY}H${head - 10}`} strokeDasharray="2 4" {...thin} />
      <text x={head + 12} y={(surfaceY + spoutY) / 2 + 7} className={LETTER}>
        h
      </text>
      <text x={height + 11} y={(spoutY + TABLE) / 2 + 14} className={LETTER}>
        y
      </text>
    </>
  );
}

function Ruler({ drawing: { ruler } }: PartProps) {
  return (
    <g stroke="var(--color-ink-3)" strokeWidth="1.2">
      {ruler.map((x, cm) => (
        <path key={x} d={`M${x} ${TABLE}v${cm % 5 === 0 ? 12 : 6}`} />
      ))}
      {ruler.map((x, cm) =>
        cm > 0 && cm % 10 === 0 ? (
          <text key={x} x={x} y={TABLE + 30} textAnchor="middle" stroke="none" className="fill-ink-3 text-xs">
            {cm}
          </text>
        ) : null,
      )}
    </g>
  );
}

interface SpoutFigureProps {
  readonly viewBox: string;
  readonly className?: string;
}

/** The Leaning Spout: the predicted arc in copper, the readings in water. */
export function SpoutFigure({ viewBox, className }: SpoutFigureProps) {
  const drawing = useMemo(() => drawSpout(), []);
  return (
    <svg viewBox={viewBox} aria-hidden="true" className={className}>
      <SetUp drawing={drawing} />
      <path d={`M-2000 ${TABLE}H4000`} stroke="var(--color-ink)" strokeWidth="2" />
      <Ruler drawing={drawing} />
      <path d={drawing.band} fill="var(--color-copper)" opacity=".14" />
      <path d={drawing.arc} fill="none" stroke="var(--color-copper)" strokeWidth="2.2" />
      {drawing.readings.map(([x, y]) => (
        <g key={x} stroke="var(--color-water)" strokeWidth="1.6">
          <path d={`M${x} ${y - BAR}v${2 * BAR}M${x - 4} ${y - BAR}h8M${x - 4} ${y + BAR}h8`} />
          <circle
            cx={x}
            cy={y}
            r="5"
            fill="var(--color-water)"
            stroke="var(--color-desk)"
            strokeWidth="1.5"
          />
        </g>
      ))}
      <Measures drawing={drawing} />
    </svg>
  );
}
