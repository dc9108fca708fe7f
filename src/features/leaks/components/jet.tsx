import { classNames } from '#src/lib/class-names.ts';

interface JetProps {
  /** 0 to 10: how far the jet reaches. Only its length is seen. */
  readonly pressure: number;
  readonly isAnswered: boolean;
  readonly onPress: () => void;
}

/** Shortest reach, and what one unit of pressure adds, in % of the row. */
const LEAST = 5;
const EACH = 2.7;

/** How far a jet reaches, in % of the row. */
export function reachOf(pressure: number): number {
  return LEAST + EACH * pressure;
}

/** Stroke of a jet: a burst is thicker. */
function strokeOf(pressure: number): number {
  return pressure >= 7 ? 4.2 : 3;
}

/** Water leaving a hole: drawn only; its question is what is read and pressed by keys. */
export function Jet({ pressure, isAnswered, onPress }: JetProps) {
  return (
    <svg
      aria-hidden="true"
      viewBox="0 0 100 60"
      preserveAspectRatio="none"
      onClick={onPress}
      style={{ width: `${reachOf(pressure)}%` }}
      className={classNames(
        'absolute top-[18px] left-0 h-[60px] cursor-pointer overflow-visible',
        isAnswered ? 'text-ink-3' : 'text-leak',
      )}
    >
      <path
        d="M0 3Q68 3 96 40"
        fill="none"
        stroke="currentColor"
        strokeLinecap="round"
        strokeWidth={isAnswered ? 2.6 : strokeOf(pressure)}
        strokeDasharray={isAnswered ? '.1 6' : undefined}
        vectorEffect="non-scaling-stroke"
      />
      <path
        d="M92 47H104"
        stroke="currentColor"
        strokeLinecap="round"
        strokeWidth="1.4"
        vectorEffect="non-scaling-stroke"
      />
    </svg>
  );
}
