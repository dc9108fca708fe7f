import type { Fight, Team } from '#shared/contracts/teams.ts';
import { channelSentence } from './season-channel.tsx';

interface SeasonChannelPhoneProps {
  readonly team: Team;
  readonly next: Fight | null;
  readonly now: Date;
}

const WIDTH = 354;
const DAY_MS = 86_400_000;

/** The stretch around today: the fight before, today, and the next. */
export function SeasonChannelPhone({ team, next, now }: SeasonChannelPhoneProps) {
  const past = team.fights.filter(({ at }) => new Date(at) < now).at(-1) ?? null;
  const from = (past ? Date.parse(past.at) : now.getTime() - 14 * DAY_MS) - 3 * DAY_MS;
  const to = (next ? Date.parse(next.at) : now.getTime() + 14 * DAY_MS) + 9 * DAY_MS;
  const at = (time: number) => 8 + ((time - from) / (to - from)) * (WIDTH - 16);
  const today = at(now.getTime());
  const shown = [past, next].filter((fight) => fight !== null);
  return (
    <svg
      viewBox={`0 0 ${WIDTH} 72`}
      role="img"
      aria-label={channelSentence(team, next, now)}
      className="mt-2.5 w-full text-xs"
    >
      <rect x="8" y="30" width={today - 8} height="12" fill="var(--color-water-fill)" />
      <path d={`M8 30H${today}V42`} fill="none" stroke="var(--color-water)" strokeWidth="2" />
      <path d={`M8 42H${WIDTH - 8}`} stroke="var(--color-ink-2)" strokeWidth="1.5" />
      {shown.map((fight) => {
        const x = at(Date.parse(fight.at));
        return (
          <g key={fight.id}>
            <path d={`M${x} 6V42`} stroke="var(--color-ink)" strokeWidth="1.5" />
            <text x={x + 7} y="16" className="fill-ink font-[650]">
              {fight.name}
            </text>
          </g>
        );
      })}
      <text x={today + 2} y="61" textAnchor="end" className="fill-water font-semibold">
        today
      </text>
    </svg>
  );
}
