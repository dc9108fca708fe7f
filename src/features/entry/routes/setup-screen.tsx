import { useQuery } from '@tanstack/react-query';
import { useForm } from 'react-hook-form';
import { useNavigate, useParams } from 'react-router-dom';
import { Loading } from '#src/components/loading.tsx';
import { paths } from '#src/lib/paths.ts';
import { setupQuery, useSetUp } from '../api/enter.ts';
import { DeadLinkPage } from '../components/dead-link-page.tsx';
import { EmailField, NameField, PassphraseField } from '../components/entry-fields.tsx';
import { EntryForm, type EntryValues } from '../components/entry-form.tsx';
import { EntryPage } from '../components/entry-page.tsx';

/** Makes the account that looks after the installation. */
export function Component() {
  const { token = '' } = useParams();
  const { data, error, refetch } = useQuery(setupQuery(token));
  if (data) return <SetUp token={token} />;
  if (error) return <DeadLinkPage error={error} onAgain={() => void refetch()} />;
  return <Loading what="the set-up" />;
}

function SetUp({ token }: { readonly token: string }) {
  const form = useForm<EntryValues>({ defaultValues: { name: '', email: '', passphrase: '' } });
  const { mutateAsync, isPending, error } = useSetUp(token);
  const navigate = useNavigate();
  return (
    <EntryPage
      title="Set Holdwater up"
      sentence="You will look after this installation: open teams, invite their captains, lock accounts. You read no team’s problems; for that, be invited with another address."
    >
      <EntryForm
        form={form}
        onSubmit={async (values) => {
          await mutateAsync(values);
          await navigate(paths.admin(), { replace: true });
        }}
        error={error}
        busy={isPending}
        action="Make my account"
      >
        <NameField form={form} />
        <EmailField form={form} />
        <PassphraseField form={form} isNew />
      </EntryForm>
    </EntryPage>
  );
}
