import type { ClaimFinding } from '#shared/evidence/findings.ts';

const REACH = 4.4;
const WIDTH = 264;
const at = (z: number) => (WIDTH / 2) * (1 + Math.max(-REACH, Math.min(REACH, z)) / REACH);
const signed = (z: number) => (z === 0 ? '0' : z < 0 ? `\u2212${-z}` : `+${z}`);

/** A claim's place on the scale of u, between its margins; a dashed line where there is no place yet. */
export function ClaimScale({ finding }: { readonly finding: ClaimFinding }) {
  const { z, k, verdict } = finding;
  const hue = verdict === 'Leaks' ? 'text-difference' : 'text-measured';
  const ticks = [-2 * k, -k, 0, k, 2 * k].filter((tick) => Math.abs(tick) <= REACH);
  return (
    <svg
      width={WIDTH}
      height="46"
      viewBox={`0 0 ${WIDTH} 46`}
      className="max-w-full overflow-visible"
      role="img"
      aria-label={spoken(finding)}
    >
      <rect x={at(-k)} width={at(k) - at(-k)} y="4" height="18" className="fill-ink" opacity=".05" />
      <path d={`M0 22H${WIDTH}`} className="stroke-rule" />
      <path d={`M${at(-k)} 4v18M${at(k)} 4v18`} className="stroke-ink" strokeWidth="1.25" />
      <path d={`M${at(0)} 1v21`} className="stroke-predicted" strokeWidth="2" />
      {ticks.map((tick) => (
        <text key={tick} x={at(tick)} y="40" textAnchor="middle" className="fill-ink-3 text-2xs">
          {signed(tick)}
        </text>
      ))}
      {z === null ? (
        <path d={`M4 13H${WIDTH - 4}`} className="stroke-ink-2" strokeWidth="1.5" strokeDasharray="3 4" />
      ) : (
        <g className={hue}>
          <path
            d={`M${at(0)} 13H${at(z)}`}
            stroke="currentColor"
            strokeWidth={verdict === 'Leaks' ? 3 : 1.5}
          />
          {verdict === 'Leaks' ? (
            <path d={`M${at(z)} 13l${z < 0 ? 8 : -8}-5v10z`} fill="currentColor" />
          ) : (
            <circle cx={at(z)} cy="13" r="4" fill="currentColor" />
          )}
        </g>
      )}
    </svg>
  );
}

function spoken({ z, k, verdict }: ClaimFinding): string {
  return z === null
    ? `${verdict}: no place on the scale yet`
    : `${z.toFixed(1)} u apart, margin ${k} u: ${verdict}`;
}
