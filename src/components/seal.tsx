import { SEAL_SHAPE, sealMarks } from '#shared/editions/seal-marks.ts';

interface SealProps {
  readonly n: number;
  /** The fingerprint; its first 48 bits are drawn. */
  readonly seal: string;
  /** 92 on Editions, 64 on Copies, 56 on an opponent copy. */
  readonly size?: 56 | 64 | 92;
  readonly className?: string | undefined;
}

const { side, outerRadius, outerWidth, innerRadius, innerWidth, markWidth, dotRadius, foot, number } =
  SEAL_SHAPE;

/** The stamp of an edition: a stroke for one, a dot for nought, its number in the middle. */
export function Seal({ n, seal, size = 92, className }: SealProps) {
  return (
    <svg
      width={size}
      height={size}
      viewBox={`0 0 ${side} ${side}`}
      role="img"
      aria-label={`Seal of edition ${n}`}
      className={className}
      fill="none"
      stroke="currentColor"
    >
      <g strokeWidth={markWidth} strokeLinecap="round">
        {sealMarks(seal).map((mark, index) =>
          mark.kind === 'dot' ? (
            <circle key={index} cx={mark.x} cy={mark.y} r={dotRadius} fill="currentColor" stroke="none" />
          ) : (
            <path key={index} d={`M${mark.x1} ${mark.y1}L${mark.x2} ${mark.y2}`} />
          ),
        )}
      </g>
      <circle cx={side / 2} cy={side / 2} r={outerRadius} strokeWidth={outerWidth} />
      <circle cx={side / 2} cy={side / 2} r={innerRadius} strokeWidth={innerWidth} />
      <path d={`M${foot.from} ${foot.y}H${foot.to}`} strokeWidth={foot.width} />
      <text
        x={side / 2}
        y={number.y}
        textAnchor="middle"
        fill="currentColor"
        stroke="none"
        className="font-report font-medium"
        style={{ fontSize: n > 9 ? number.size * 0.72 : number.size }}
      >
        {n}
      </text>
    </svg>
  );
}
