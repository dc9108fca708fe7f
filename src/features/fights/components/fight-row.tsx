import type { KeptEvent, KeptFight } from '#shared/contracts/fights.ts';
import type { ProblemSummary, Team } from '#shared/contracts/teams.ts';
import { Word } from '#src/components/word.tsx';
import { timeOfDay, weekdayDayAndMonth } from '#src/lib/dates/say-date.ts';
import { stageSentence } from '../sentences/fight-words.ts';

interface FightRowProps {
  readonly team: Team;
  readonly fight: KeptFight;
  readonly event: KeptEvent | null;
  readonly problems: readonly ProblemSummary[];
  /** null: who reads may not change it. */
  readonly onChange: (() => void) | null;
}

/** A fight told in words. */
export function FightRow({ team, fight, event, problems, onChange }: FightRowProps) {
  const at = new Date(fight.at);
  const titleOf = (number: number) =>
    problems.find((problem) => problem.number === number)?.title ?? `problem ${number}`;
  return (
    <div className="grid gap-x-6 gap-y-1 py-4 sm:grid-cols-[260px_1fr_auto]">
      <div>
        <h2 className="font-report text-[21px]/7 font-medium">{fight.name}</h2>
        <p className="text-sm text-ink-2">
          {weekdayDayAndMonth(at)}, {timeOfDay(at)}
          {fight.place ? `, ${fight.place}` : ''}
        </p>
      </div>
      <div className="font-report text-[17px]/[26px] text-ink-2">
        {fight.stages.length === 0 && <p className="text-ink-3 italic">No stages are set yet.</p>}
        {fight.stages.map((stage, index) => (
          <p key={index}>{stageSentence(stage, index, titleOf, team.people)}</p>
        ))}
        {(event || fight.result) && (
          <p>
            {event && `It is held by the rules of ${event.name}.`}
            {fight.result && ` We came ${fight.result}.`}
          </p>
        )}
      </div>
      {onChange && (
        <div>
          <Word onClick={onChange}>
            Change<span className="sr-only"> {fight.name}</span>
          </Word>
        </div>
      )}
    </div>
  );
}
