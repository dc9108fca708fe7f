import { useQuery } from '@tanstack/react-query';
import { useForm } from 'react-hook-form';
import { useNavigate, useParams } from 'react-router-dom';
import type { OpenInvitation } from '#shared/contracts/people.ts';
import { Loading } from '#src/components/loading.tsx';
import { dayAndMonth } from '#src/lib/dates/say-date.ts';
import { paths } from '#src/lib/paths.ts';
import { invitationQuery, useJoin } from '../api/enter.ts';
import { DeadLinkPage } from '../components/dead-link-page.tsx';
import { NameField, PassphraseField } from '../components/entry-fields.tsx';
import { EntryForm, type EntryValues } from '../components/entry-form.tsx';
import { EntryPage } from '../components/entry-page.tsx';

const ROLE_WORDS = { captain: 'captain', member: 'student', advisor: 'advisor' } as const;

/** Accepts an invitation. */
export function Component() {
  const { token = '' } = useParams();
  const { data, error, refetch } = useQuery(invitationQuery(token));
  if (data) return <Join token={token} invitation={data} />;
  if (error) return <DeadLinkPage error={error} onAgain={() => void refetch()} />;
  return <Loading what="the invitation" />;
}

function Join({ token, invitation }: { readonly token: string; readonly invitation: OpenInvitation }) {
  const { team, university, role, by, email, hasAccount, until } = invitation;
  const form = useForm<EntryValues>({
    defaultValues: { name: invitation.name, email, passphrase: '' },
  });
  const { mutateAsync, isPending, error } = useJoin(token);
  const navigate = useNavigate();
  return (
    <EntryPage
      title={`Join ${team}`}
      sentence={
        <p>
          {by} asks you to join {team} of {university} as{' '}
          <b className="font-medium text-ink">{ROLE_WORDS[role]}</b>.{' '}
          {hasAccount
            ? 'You have an account here: its passphrase lets you in.'
            : `The invitation is open until ${dayAndMonth(new Date(until))}.`}
        </p>
      }
    >
      <p className="mb-4 text-sm text-ink-2">You sign in as {email}.</p>
      <EntryForm
        form={form}
        onSubmit={async ({ name, passphrase }) => {
          const joined = await mutateAsync({ name, passphrase });
          await navigate(paths.season(joined.team), { replace: true });
        }}
        error={error}
        busy={isPending}
        action={`Join ${team}`}
      >
        {!hasAccount && <NameField form={form} />}
        <PassphraseField form={form} isNew={!hasAccount} />
      </EntryForm>
    </EntryPage>
  );
}
