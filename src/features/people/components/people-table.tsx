import { useState } from 'react';
import type { Person, ProblemSummary } from '#shared/contracts/teams.ts';
import { Button } from '#src/components/button.tsx';
import { Dialog } from '#src/components/dialog.tsx';
import { Notice } from '#src/components/notice.tsx';
import { sentenceOf } from '#src/lib/api/api-error.ts';
import { dayAndMonth } from '#src/lib/dates/say-date.ts';
import { say } from '#src/lib/sill-store.ts';
import { useTeam } from '#src/lib/team/team-context.ts';
import { usePeopleActions } from '../api/people.ts';
import { PersonRow } from './person-row.tsx';

/** Who works on what, and who takes the stage when. The captain changes roles and removes. */
export function PeopleTable({ problems }: { readonly problems: readonly ProblemSummary[] }) {
  const { team, role } = useTeam();
  const { changeRole, remove } = usePeopleActions(team.slug);
  const [leaving, setLeaving] = useState<Person | null>(null);
  const [now] = useState(() => new Date());
  const close = () => {
    setLeaving(null);
    remove.reset();
  };
  return (
    <>
      {changeRole.error && <Notice title={sentenceOf(changeRole.error)} className="mb-3" />}
      <table className="w-full border-collapse max-md:block">
        <thead className="max-md:sr-only">
          <tr className="border-b-[1.25px] border-ink text-left text-sm text-ink-2">
            <th scope="col" className="pb-1 font-normal">
              <span className="sr-only">Person</span>
            </th>
            <th scope="col" className="pb-1 font-normal">
              Works on
            </th>
            {team.fights.map(({ id, name, at }) => (
              <th key={id} scope="col" className="pr-4 pb-1 font-normal">
                {name}, {dayAndMonth(new Date(at))}
              </th>
            ))}
          </tr>
        </thead>
        <tbody className="max-md:block">
          {team.people.map((person) => (
            <PersonRow
              key={person.id}
              person={person}
              fights={team.fights}
              problems={problems}
              now={now}
              actions={
                role === 'captain'
                  ? {
                      onRole: (next) => changeRole.mutate({ person: person.id, role: next }),
                      onRemove: () => setLeaving(person),
                    }
                  : null
              }
            />
          ))}
        </tbody>
      </table>
      {leaving && (
        <Dialog
          open
          onClose={close}
          title={`Remove ${leaving.name} from ${team.name}?`}
          sentence="What is open on their screens closes, and they see nothing of the team any more. What they logged and wrote stays, under their name."
          actions={
            <>
              <Button kind="plain" onClick={close}>
                Keep {leaving.name}
              </Button>
              <Button
                kind="risk"
                busy={remove.isPending}
                onClick={() =>
                  remove.mutate(leaving.id, {
                    onSuccess: () => {
                      say(`${leaving.name} is removed from the team.`);
                      close();
                    },
                  })
                }
              >
                Remove
              </Button>
            </>
          }
        >
          {remove.error && <Notice title={sentenceOf(remove.error)} />}
        </Dialog>
      )}
    </>
  );
}
