import { useState } from 'react';
import type { AdminPerson } from '#shared/contracts/admin.ts';
import { Button } from '#src/components/button.tsx';
import { Dialog } from '#src/components/dialog.tsx';
import { Notice } from '#src/components/notice.tsx';
import { Word } from '#src/components/word.tsx';
import { sentenceOf } from '#src/lib/api/api-error.ts';
import { say } from '#src/lib/sill-store.ts';
import { useAdminActions } from '../api/admin.ts';

/** Every account, and whether it is open. */
export function AccountList({ people }: { readonly people: readonly AdminPerson[] }) {
  const { changePerson } = useAdminActions();
  const [locking, setLocking] = useState<AdminPerson | null>(null);
  const set = (person: AdminPerson, isDisabled: boolean) =>
    changePerson.mutate(
      { person: person.id, isDisabled },
      {
        onSuccess: () => {
          say(`The account of ${person.name} is ${isDisabled ? 'locked' : 'open'}.`);
          setLocking(null);
        },
      },
    );
  return (
    <>
      {changePerson.error && !locking && <Notice title={sentenceOf(changePerson.error)} className="my-3" />}
      <ul>
        {people.map((person) => (
          <li
            key={person.id}
            className="flex flex-wrap items-baseline gap-x-6 gap-y-1 border-b border-hair py-3"
          >
            <b className="font-report text-[19px]/6 font-medium">{person.name}</b>
            <span className="min-w-0 flex-1 basis-64 text-sm break-words text-ink-2">
              {person.email}; {placeWords(person)}
            </span>
            {!person.isAdministrator && (
              <Word onClick={() => (person.isDisabled ? set(person, false) : setLocking(person))}>
                {person.isDisabled ? 'Open' : 'Lock'}
                <span className="sr-only"> the account of {person.name}</span>
              </Word>
            )}
          </li>
        ))}
      </ul>
      {locking && (
        <Dialog
          open
          onClose={() => setLocking(null)}
          title={`Lock the account of ${locking.name}?`}
          sentence="They are signed out everywhere at once and cannot sign in. What they wrote stays. You can open the account again."
          actions={
            <>
              <Button kind="plain" onClick={() => setLocking(null)}>
                Leave it open
              </Button>
              <Button kind="risk" busy={changePerson.isPending} onClick={() => set(locking, true)}>
                Lock
              </Button>
            </>
          }
        >
          {changePerson.error && <Notice title={sentenceOf(changePerson.error)} />}
        </Dialog>
      )}
    </>
  );
}

function placeWords({ teams, isAdministrator, isDisabled }: AdminPerson): string {
  const where = isAdministrator ? 'looks after the installation' : teams.join(', ') || 'in no team';
  return isDisabled ? `${where}; locked` : where;
}
