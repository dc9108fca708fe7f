import { useForm } from 'react-hook-form';
import { WordLink } from '#src/components/word.tsx';
import { useAskForReset } from '../api/enter.ts';
import { EmailField } from '../components/entry-fields.tsx';
import { EntryForm, type EntryValues } from '../components/entry-form.tsx';
import { EntryPage } from '../components/entry-page.tsx';

/** Asks for a link by mail; says the same whether anybody has the address or not. */
export function Component() {
  const form = useForm<EntryValues>({ defaultValues: { name: '', email: '', passphrase: '' } });
  const { mutateAsync, isPending, isSuccess, error, variables } = useAskForReset();
  if (isSuccess) {
    return (
      <EntryPage
        title="Look into your mail"
        sentence={
          <p role="status">
            If <b className="font-medium text-ink">{variables}</b> has an account here, a link to choose a new
            passphrase is on its way. It opens once, within an hour.
          </p>
        }
      >
        <WordLink to="/">Go to sign in</WordLink>
      </EntryPage>
    );
  }
  return (
    <EntryPage
      title="Forgotten your passphrase?"
      sentence="Write your address, and a link to choose a new one comes by mail."
    >
      <EntryForm
        form={form}
        onSubmit={({ email }) => mutateAsync(email)}
        error={error}
        busy={isPending}
        action="Mail me the link"
      >
        <EmailField form={form} />
      </EntryForm>
      <p className="mt-5">
        <WordLink to="/">Back to sign in</WordLink>
      </p>
    </EntryPage>
  );
}
