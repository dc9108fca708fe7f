import { useForm } from 'react-hook-form';
import { useParams } from 'react-router-dom';
import { WordLink } from '#src/components/word.tsx';
import { ApiError } from '#src/lib/api/api-error.ts';
import { useResetPassphrase } from '../api/enter.ts';
import { PassphraseField } from '../components/entry-fields.tsx';
import { EntryForm, type EntryValues } from '../components/entry-form.tsx';
import { EntryPage } from '../components/entry-page.tsx';

/** Chooses a new passphrase with the link of a mail. */
export function Component() {
  const { token = '' } = useParams();
  const form = useForm<EntryValues>({ defaultValues: { name: '', email: '', passphrase: '' } });
  const { mutateAsync, isPending, isSuccess, error } = useResetPassphrase(token);
  if (isSuccess) {
    return (
      <EntryPage
        title="Your passphrase is new"
        sentence={<p role="status">You are signed out everywhere. Sign in with the new passphrase.</p>}
      >
        <WordLink to="/">Go to sign in</WordLink>
      </EntryPage>
    );
  }
  const isDead = error instanceof ApiError && error.status === 404;
  return (
    <EntryPage title="Choose a new passphrase" sentence="It signs you out everywhere else.">
      <EntryForm
        form={form}
        onSubmit={({ passphrase }) => mutateAsync(passphrase)}
        error={error}
        busy={isPending}
        action="Set the passphrase"
      >
        <PassphraseField form={form} isNew />
      </EntryForm>
      {isDead && (
        <p className="mt-5">
          <WordLink to="/forgotten">Ask for a new link</WordLink>
        </p>
      )}
    </EntryPage>
  );
}
