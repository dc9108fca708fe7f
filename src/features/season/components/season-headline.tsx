import { Fragment } from 'react';
import type { Fight, ProblemSummary } from '#shared/contracts/teams.ts';
import { daysBetween, inDays, timeOfDay, weekdayDayAndMonth } from '#src/lib/dates/say-date.ts';
import { tellStages } from '../sentences/stage-words.ts';

interface SeasonHeadlineProps {
  readonly fight: Fight | null;
  readonly hasFights: boolean;
  readonly problems: readonly ProblemSummary[];
  readonly now: Date;
}

const HEADLINE =
  'font-report text-[37px]/[42px] font-medium tracking-[-.015em] text-balance sm:text-[50px]/[56px]';
export const SEASON_SENTENCE =
  'mt-2.5 max-w-[1000px] font-report text-[17px]/[25px] text-pretty text-ink-2 sm:text-[19px]/[29px]';

/** Days to the next fight, and what we do in it. */
export function SeasonHeadline({ fight, hasFights, problems, now }: SeasonHeadlineProps) {
  if (!fight) {
    return (
      <>
        <h1 className={HEADLINE}>{hasFights ? 'The last fight is over' : 'No fight is set yet'}</h1>
        <p className={SEASON_SENTENCE}>
          {hasFights ? 'Results stand below, each at its day.' : 'Work goes on below; dates will stand here.'}
        </p>
      </>
    );
  }
  const at = new Date(fight.at);
  const titleOf = (number: number) =>
    problems.find((problem) => problem.number === number)?.title ?? `problem ${number}`;
  const stages = tellStages(fight, titleOf);
  return (
    <>
      <h1 className={HEADLINE}>
        {fight.name} is {inDays(daysBetween(now, at))}
      </h1>
      <p className={SEASON_SENTENCE}>
        {weekdayDayAndMonth(at)}, {timeOfDay(at)}
        {fight.place ? `, ${fight.place}` : ''}.{stages.length > 0 && ' We '}
        {stages.map(({ role, title, against }, index) => (
          <Fragment key={role}>
            {index > 0 && (index === stages.length - 1 ? ' and ' : ', ')}
            {role} <b className="font-medium text-ink">{title}</b>
            {against !== null && (role === 'report' ? ` to ${against}` : ` of ${against}`)}
          </Fragment>
        ))}
        {stages.length > 0 && '.'}
      </p>
    </>
  );
}
