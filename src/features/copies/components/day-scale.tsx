import type { Fight } from '#shared/contracts/teams.ts';
import type { BorrowedCopy, Copy } from '#shared/contracts/copies.ts';

type Lent = Pick<Copy | BorrowedCopy, 'from' | 'until' | 'standing' | 'takenBackAt'>;

/** The days that all copies of a page are drawn on. */
export interface DayScale {
  readonly from: number;
  readonly to: number;
  readonly now: number;
  readonly fights: readonly Fight[];
}

const DAY = 86_400_000;
/** The drawing's own width. */
export const SCALE_WIDTH = 336;
const EDGE = 34;
/** Fights further away than this from every copy are not drawn. */
const NEAR = 20 * DAY;
/** Names nearer than this would run into one another. */
const NAME_ROOM = 46;

/** One scale for everything that is out or was, with today and the fights near it. */
export function dayScale(lent: readonly Lent[], fights: readonly Fight[], now: Date): DayScale {
  const today = now.getTime();
  const moments = [today, ...lent.flatMap(({ from, until }) => [Date.parse(from), Date.parse(until)])];
  const [first, last] = [Math.min(...moments), Math.max(...moments)];
  const near = fights.filter(({ at }) => Date.parse(at) > first - NEAR && Date.parse(at) < last + NEAR);
  const all = [...moments, ...near.map(({ at }) => Date.parse(at))];
  return { from: Math.min(...all) - DAY, to: Math.max(...all) + DAY, now: today, fights: near };
}

function placeOn({ from, to }: DayScale, moment: number): number {
  return EDGE + ((moment - from) / Math.max(DAY, to - from)) * (SCALE_WIDTH - 2 * EDGE);
}

/** The head of the scale: fights and today by name. */
export function DayScaleHead({ scale }: { readonly scale: DayScale }) {
  const today = placeOn(scale, scale.now);
  return (
    <svg
      viewBox={`0 0 ${SCALE_WIDTH} 24`}
      width={SCALE_WIDTH}
      height="24"
      aria-hidden="true"
      className="overflow-visible text-xs"
    >
      {scale.fights.map(({ id, name, at }) => {
        const x = placeOn(scale, Date.parse(at));
        return (
          <g key={id}>
            {Math.abs(x - today) > NAME_ROOM && (
              <text x={x} y="13" textAnchor="middle" className="fill-ink-2">
                {name.toLowerCase()}
              </text>
            )}
            <path d={`M${x} 18v6`} stroke="var(--color-ink-2)" />
          </g>
        );
      })}
      <text x={today} y="13" textAnchor="middle" className="fill-water font-semibold">
        today
      </text>
    </svg>
  );
}

/** One copy as a short channel from its first to its last day, filled up to today. */
export function DayChannel({ scale, copy }: { readonly scale: DayScale; readonly copy: Lent }) {
  const from = placeOn(scale, Date.parse(copy.from));
  const end = copy.takenBackAt === null ? copy.until : copy.takenBackAt;
  const to = Math.max(from + 4, placeOn(scale, Date.parse(end)));
  const isOver = copy.standing === 'ended' || copy.standing === 'taken back';
  const level = Math.min(to, Math.max(from, isOver ? to : placeOn(scale, scale.now)));
  return (
    <svg
      viewBox={`0 0 ${SCALE_WIDTH} 20`}
      width={SCALE_WIDTH}
      height="20"
      aria-hidden="true"
      className="max-w-full overflow-visible"
    >
      <rect
        x={from}
        y="6"
        width={level - from}
        height="10"
        fill="var(--color-water-fill)"
        opacity={isOver ? 0.55 : 1}
      />
      {!isOver && level > from && (
        <path d={`M${from} 6H${level}`} stroke="var(--color-water)" strokeWidth="2" />
      )}
      <path
        d={`M${from} 2V16H${to}V2`}
        fill="none"
        stroke="var(--color-ink-2)"
        strokeWidth="1.5"
        strokeLinejoin="round"
      />
    </svg>
  );
}
