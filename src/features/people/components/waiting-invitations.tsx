import type { Invitation } from '#shared/contracts/people.ts';
import { Notice } from '#src/components/notice.tsx';
import { Word } from '#src/components/word.tsx';
import { sentenceOf } from '#src/lib/api/api-error.ts';
import { say } from '#src/lib/sill-store.ts';
import { usePeopleActions } from '../api/people.ts';
import { invitationWords } from '../sentences/people-words.ts';

interface WaitingInvitationsProps {
  readonly team: string;
  readonly invitations: readonly Invitation[];
}

/** Who is asked and has not come yet. */
export function WaitingInvitations({ team, invitations }: WaitingInvitationsProps) {
  const { withdraw } = usePeopleActions(team);
  return (
    <>
      {withdraw.error && <Notice title={sentenceOf(withdraw.error)} className="mt-3" />}
      <ul>
        {invitations.map((invitation) => (
          <li
            key={invitation.id}
            className="flex flex-wrap items-baseline gap-x-6 gap-y-1 border-b border-hair py-3"
          >
            <b className="font-report text-[19px]/6 font-medium">{invitation.name}</b>
            <span className="min-w-0 flex-1 basis-64 text-sm break-words text-ink-2">
              {invitation.email}; {invitationWords(invitation)}
            </span>
            <Word
              onClick={() =>
                withdraw.mutate(invitation.id, {
                  onSuccess: () => say(`The invitation of ${invitation.name} is withdrawn.`),
                })
              }
            >
              Withdraw<span className="sr-only"> the invitation of {invitation.name}</span>
            </Word>
          </li>
        ))}
      </ul>
      {invitations.length === 0 && (
        <p className="py-4 font-report text-[17px]/6 text-ink-3 italic">No invitation waits.</p>
      )}
    </>
  );
}
