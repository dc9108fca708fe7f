import type { AdminTeam } from '#shared/contracts/admin.ts';
import { Notice } from '#src/components/notice.tsx';
import { Word } from '#src/components/word.tsx';
import { sentenceOf } from '#src/lib/api/api-error.ts';
import { countOf } from '#src/lib/say/count-of.ts';
import { sayList } from '#src/lib/say/say-list.ts';
import { say } from '#src/lib/sill-store.ts';
import { useAdminActions } from '../api/admin.ts';

/** Every team: who leads it and how many are in it. */
export function TeamList({ teams }: { readonly teams: readonly AdminTeam[] }) {
  const { inviteCaptain } = useAdminActions();
  return (
    <>
      {inviteCaptain.error && <Notice title={sentenceOf(inviteCaptain.error)} className="my-3" />}
      <ul>
        {teams.map((team) => (
          <li
            key={team.slug}
            className="flex flex-wrap items-baseline gap-x-6 gap-y-1 border-b border-hair py-3"
          >
            <b className="font-report text-[19px]/6 font-medium">{team.name}</b>
            <span className="min-w-0 flex-1 basis-64 text-sm text-ink-2">
              {team.university}; {countOf(team.people, 'person', 'people')}; {captainWords(team)}
            </span>
            {team.captains.length === 0 &&
              team.invited.map(({ name, email }) => (
                <Word
                  key={email}
                  onClick={() =>
                    inviteCaptain.mutate(
                      { team: team.slug, name, email },
                      { onSuccess: () => say(`${name} is invited again. The earlier link opens nothing.`) },
                    )
                  }
                >
                  Invite {name} again
                </Word>
              ))}
          </li>
        ))}
      </ul>
      {teams.length === 0 && (
        <p className="py-4 font-report text-[17px]/6 text-ink-3 italic">No team is open yet.</p>
      )}
    </>
  );
}

function captainWords({ captains, invited }: AdminTeam): string {
  if (captains.length > 0) return `led by ${sayList(captains)}`;
  const [first] = invited;
  if (!first) return 'without a captain';
  return first.isOver ? `the time for ${first.name} to join is over` : `${first.name} is invited as captain`;
}
