import { useQuery } from '@tanstack/react-query';
import type { ProblemSummary } from '#shared/contracts/teams.ts';
import { Notice } from '#src/components/notice.tsx';
import { Word } from '#src/components/word.tsx';
import { sentenceOf } from '#src/lib/api/api-error.ts';
import { useTeam } from '#src/lib/team/team-context.ts';
import { useTitle } from '#src/lib/use-title.ts';
import { invitationsQuery } from '../api/people.ts';
import { InviteForm } from '../components/invite-form.tsx';
import { MailList } from '../components/mail-list.tsx';
import { PeopleTable } from '../components/people-table.tsx';
import { WaitingInvitations } from '../components/waiting-invitations.tsx';
import { peopleSentence } from '../sentences/people-words.ts';

/** The team's people in words; the captain also invites, and sees the mail that this caused. */
export function PeoplePage({ problems }: { readonly problems: readonly ProblemSummary[] }) {
  const { team, role } = useTeam();
  const isCaptain = role === 'captain';
  const {
    data: invitations,
    error,
    refetch,
  } = useQuery({ ...invitationsQuery(team.slug), enabled: isCaptain });
  useTitle('People', team.name);
  return (
    <main
      id="page"
      tabIndex={-1}
      data-region="page"
      className="page-top mx-auto max-w-[1304px] px-8 pb-16 max-sm:px-0"
    >
      <header className="mb-5 max-sm:px-4.5">
        <h1 className="h1">People</h1>
        <p className="mt-1 max-w-[840px] font-report text-report text-ink-2">
          {peopleSentence(team.people.length, invitations ?? [])}
        </p>
      </header>
      <section aria-label="The team" className="page-sheet px-8 pt-6 pb-3 max-sm:px-4.5">
        <PeopleTable problems={problems} />
        {isCaptain && <InviteForm team={team.slug} />}
      </section>
      {isCaptain && (
        <>
          <section aria-labelledby="waiting" className="page-sheet mt-6 px-8 pt-6 pb-3 max-sm:px-4.5">
            <h2
              id="waiting"
              className="border-b-[1.25px] border-ink pb-1 font-report text-[21px]/7 font-medium"
            >
              Invitations that wait
            </h2>
            {error && (
              <Notice title="The invitations could not be brought." className="my-3">
                {sentenceOf(error)} <Word onClick={() => void refetch()}>Try again</Word>
              </Notice>
            )}
            {invitations && <WaitingInvitations team={team.slug} invitations={invitations} />}
          </section>
          <section aria-labelledby="mail" className="page-sheet mt-6 px-8 pt-6 pb-3 max-sm:px-4.5">
            <h2 id="mail" className="border-b-[1.25px] border-ink pb-1 font-report text-[21px]/7 font-medium">
              Mail the team caused
            </h2>
            <MailList team={team.slug} />
          </section>
        </>
      )}
      <p className="mt-5 text-sm text-ink-2 max-sm:px-4.5">Advisors cannot change the text of a report.</p>
    </main>
  );
}
