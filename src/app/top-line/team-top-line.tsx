import { useQuery } from '@tanstack/react-query';
import { Link, useLocation } from 'react-router-dom';
import { teamCopiesQuery } from '#src/features/copies/api/list-copies.ts';
import { outCount } from '#src/features/copies/sentences/copy-words.ts';
import { problemsQuery } from '#src/features/season/api/list-problems.ts';
import { paths } from '#src/lib/paths.ts';
import { countOf } from '#src/lib/say/count-of.ts';
import { useSession } from '#src/lib/session/use-session.ts';
import { useTeam } from '#src/lib/team/team-context.ts';
import { useDigitKeys } from '../keys/use-digit-keys.ts';
import { ConnectionWords } from './connection-words.tsx';
import { TopLine } from './top-line.tsx';

/** The top line of a team's own screens. */
export function TeamTopLine() {
  const { team, role } = useTeam();
  const { user } = useSession();
  const { data: problems } = useQuery(problemsQuery(team.slug));
  const { pathname } = useLocation();
  const season = paths.season(team.slug);
  const isSeason = pathname === season;
  const copies = paths.copies(team.slug);
  const isCopies = pathname === copies;
  const people = paths.people(team.slug);
  const isPeople = pathname === people;
  const { data: lent } = useQuery({ ...teamCopiesQuery(team.slug), enabled: isCopies });
  useDigitKeys([], season);
  return (
    <TopLine
      home={season}
      small={team.university}
      name={team.name}
      label="Team"
      stations={[
        {
          to: season,
          words: 'Season',
          isHere: isSeason,
          cup: isSeason && problems ? countOf(problems.length, 'problem') : null,
        },
        {
          to: copies,
          words: 'Copies',
          isHere: isCopies,
          cup: isCopies && lent ? outCount(lent.lent) : null,
        },
        {
          to: people,
          words: 'People',
          isHere: isPeople,
          cup: isPeople ? countOf(team.people.length, 'person', 'people') : null,
        },
      ]}
      others={[{ to: paths.account(), words: `${user.name}, your account` }]}
      aside={
        <>
          <Link to={paths.account()} className="font-[650] text-ink">
            {user.name}
          </Link>
          <br />
          <ConnectionWords>{role}</ConnectionWords>
        </>
      }
    />
  );
}
