import { useQuery } from '@tanstack/react-query';
import { useEffect } from 'react';
import { Loading } from '#src/components/loading.tsx';
import { Notice } from '#src/components/notice.tsx';
import { Word, WordLink } from '#src/components/word.tsx';
import { sentenceOf } from '#src/lib/api/api-error.ts';
import { paths } from '#src/lib/paths.ts';
import { keep } from '#src/lib/preferences/preference.ts';
import { useSession } from '#src/lib/session/use-session.ts';
import { nextFight } from '#src/lib/team/next-fight.ts';
import { useTeam } from '#src/lib/team/team-context.ts';
import { useIsPhone } from '#src/lib/use-media.ts';
import { useTitle } from '#src/lib/use-title.ts';
import { problemsQuery } from '../api/list-problems.ts';
import { FirstProblem } from '../components/first-problem.tsx';
import { ProblemList } from '../components/problem-list.tsx';
import { SeasonChannel } from '../components/season-channel.tsx';
import { SeasonChannelPhone } from '../components/season-channel-phone.tsx';
import { SeasonHeadline } from '../components/season-headline.tsx';
import { WaitingSentence } from '../components/waiting-sentence.tsx';
import { waitingFor } from '../sentences/waiting.ts';

/** A team's home: the next fight, what waits, and how far every problem has come. */
export function Component() {
  const { team, role } = useTeam();
  const { user } = useSession();
  const { data: problems, error, refetch } = useQuery(problemsQuery(team.slug));
  const now = new Date();
  const next = nextFight(team.fights, now);
  const Channel = useIsPhone() ? SeasonChannelPhone : SeasonChannel;
  useTitle('Season', team.name);
  useEffect(() => keep('team', team.slug), [team.slug]);
  if (!problems && !error) return <Loading what="the Season" />;
  return (
    <main
      id="page"
      tabIndex={-1}
      data-region="page"
      className="page-top mx-auto max-w-[1304px] px-4.5 pb-15 max-sm:pt-9 sm:px-8"
    >
      <SeasonHeadline fight={next} hasFights={team.fights.length > 0} problems={problems ?? []} now={now} />
      <WaitingSentence things={waitingFor({ id: user.id, role }, team.slug, problems ?? [])} />
      <div className="my-5 max-sm:my-2.5">
        <Channel team={team} next={next} now={now} />
      </div>
      {problems && problems.length > 0 && <ProblemList team={team.slug} problems={problems} />}
      {problems?.length === 0 && <FirstProblem mayWrite={role !== 'advisor'} />}
      {problems && (
        <p className="mt-5 flex flex-wrap gap-x-6 gap-y-2">
          {role !== 'advisor' && <WordLink to={paths.newProblem(team.slug)}>New problem</WordLink>}
          <WordLink to={paths.fights(team.slug)}>Fights and events</WordLink>
        </p>
      )}
      {error && (
        <Notice title="The problems could not be brought." className="my-4">
          {sentenceOf(error)} <Word onClick={() => void refetch()}>Try again</Word>
        </Notice>
      )}
      {team.isDemo && (
        <p className="mt-4 text-xs text-ink-3">
          The team, its people, its trials and its fights are invented for demonstration.
        </p>
      )}
    </main>
  );
}
