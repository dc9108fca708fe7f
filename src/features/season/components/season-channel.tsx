import type { Fight, Team } from '#shared/contracts/teams.ts';
import { dayAndMonth, dayAndShortMonth } from '#src/lib/dates/say-date.ts';
import { useWidth } from '#src/lib/use-width.ts';
import { channelScale } from './channel-scale.ts';

interface SeasonChannelProps {
  readonly team: Team;
  readonly next: Fight | null;
  readonly now: Date;
}

/** The width it is drawn for until it has been measured. */
const USUAL_WIDTH = 1240;
/** A month's name gives way where today's words stand. */
const ROOM_LEFT = 150;
const ROOM_RIGHT = 70;

/** The season as a channel, filled up to today, with its fights. */
export function SeasonChannel({ team, next, now }: SeasonChannelProps) {
  const [ref, width] = useWidth(USUAL_WIDTH);
  const scale = channelScale(team.season, width);
  const today = scale.at(now);
  const line = { stroke: 'var(--color-ink-2)', fill: 'none' } as const;
  const isEarly = today < 160;
  const months = scale.months.filter(({ x }) => x > today + ROOM_RIGHT || x < today - ROOM_LEFT);
  return (
    <svg
      ref={ref}
      height="86"
      role="img"
      aria-label={channelSentence(team, next, now)}
      className="w-full text-xs"
    >
      <rect x={scale.left} y="46" width={today - scale.left} height="13" fill="var(--color-water-fill)" />
      <path d={`M${scale.left} 42V59H${scale.right}V42`} strokeWidth="1.5" strokeLinejoin="round" {...line} />
      <path d={`M${scale.left} 46H${today}V59`} fill="none" stroke="var(--color-water)" strokeWidth="2" />
      <path d={scale.weeks.map((x) => `M${x} 55v4`).join('')} strokeWidth="1.2" {...line} />
      <text
        x={today + (isEarly ? -4 : 4)}
        y="79"
        textAnchor={isEarly ? 'start' : 'end'}
        className="fill-water font-semibold"
      >
        today, {dayAndMonth(now)}
      </text>
      {months.map(({ x, name }) => (
        <text key={x} x={x} y="79" className="fill-ink-3">
          {name}
        </text>
      ))}
      {team.fights.map((fight) => {
        const x = scale.at(new Date(fight.at));
        const isNext = fight.id === next?.id;
        const isLate = x > width - 110;
        const words = { x: isLate ? x - 9 : x + 9, textAnchor: isLate ? 'end' : 'start' } as const;
        return (
          <g key={fight.id}>
            <path d={`M${x} 8V59`} stroke="var(--color-ink)" strokeWidth={isNext ? 2.5 : 1.5} />
            <text y="18" className="fill-ink font-[650]" {...words}>
              {fight.name}
            </text>
            <text y="35" className="fill-ink-2" {...words}>
              {fightDay(fight)}
            </text>
          </g>
        );
      })}
    </svg>
  );
}

function fightDay(fight: Fight): string {
  const at = new Date(fight.at);
  return fight.result ? `${dayAndShortMonth(at)}, ${fight.result}` : dayAndMonth(at);
}

/** The same in one sentence, for who does not see it. */
export function channelSentence(team: Team, next: Fight | null, now: Date): string {
  const month = (text: string) => new Date(text).toLocaleDateString('en-GB', { month: 'long' });
  const span = `Season from ${month(team.season.from)} to ${month(team.season.to)}; today is ${dayAndMonth(now)}.`;
  return next ? `${span} ${next.name} on ${dayAndMonth(new Date(next.at))} is next.` : span;
}
