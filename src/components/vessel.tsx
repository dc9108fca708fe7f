interface VesselProps {
  /** How full, 0 to 1. */
  readonly share: number;
  readonly height: number;
  readonly width?: number;
}

/** A tall vessel with marks at a quarter, a half and three quarters; a word stands beside it. */
export function Vessel({ share, height, width = 13 }: VesselProps) {
  const radius = Math.min(6, width / 2 - 0.7);
  const bottom = height - 0.7;
  const top = bottom - share * (height - 1.4);
  const wall = `M.7 0V${bottom - radius}a${radius} ${radius} 0 0 0 ${radius} ${radius}H${width - 0.7 - radius}a${radius} ${radius} 0 0 0 ${radius} -${radius}V0`;
  return (
    <svg width={width} height={height} viewBox={`0 0 ${width} ${height}`} aria-hidden="true">
      <path d={`${wall}z`} fill="var(--color-paper)" />
      {share > 0 && (
        <>
          <path
            d={`${wall}z`}
            fill="var(--color-water-fill)"
            style={{ clipPath: `inset(${top}px 0 0 0)` }}
            className="settles"
          />
          <path d={`M.7 ${top + 1}H${width - 0.7}`} stroke="var(--color-water)" strokeWidth="2" />
        </>
      )}
      <path
        d={[0.25, 0.5, 0.75].map((mark) => `M${width - 5} ${bottom - mark * height}H${width - 0.7}`).join('')}
        stroke="var(--color-ink-3)"
        strokeWidth="1.3"
      />
      <path d={wall} fill="none" stroke="var(--color-ink-3)" strokeWidth="1.4" />
    </svg>
  );
}
