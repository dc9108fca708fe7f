import { useState } from 'react';
import type { UseFormReturn } from 'react-hook-form';
import { Button } from '#src/components/button.tsx';
import { Field } from '#src/components/field.tsx';
import type { EntryValues } from './entry-form.tsx';

interface EntryFieldProps {
  readonly form: UseFormReturn<EntryValues>;
}

const LIKE_AN_ADDRESS = /^\S+@\S+\.\S+$/;
const SHORTEST = 12;

export function NameField({ form: { register, formState } }: EntryFieldProps) {
  return (
    <Field
      label="Your name, as it stands in reports"
      size="large"
      autoComplete="name"
      error={formState.errors.name?.message}
      {...register('name', { required: 'Write the name, as it should stand in the report.' })}
    />
  );
}

export function EmailField({ form: { register, formState } }: EntryFieldProps) {
  return (
    <Field
      label="Email"
      type="email"
      size="large"
      autoComplete="username"
      error={formState.errors.email?.message}
      {...register('email', {
        validate: (text) =>
          LIKE_AN_ADDRESS.test(text.trim()) || 'Write the whole address, like ines.farrow@skerry.example.',
        setValueAs: (text: string) => text.trim(),
      })}
    />
  );
}

/** A passphrase that is chosen now, or the one of the account there is. */
export function PassphraseField({
  form: { register, formState },
  isNew,
}: EntryFieldProps & { readonly isNew: boolean }) {
  const [isShown, setShown] = useState(false);
  return (
    <Field
      label={isNew ? 'New passphrase' : 'Your passphrase'}
      type={isShown ? 'text' : 'password'}
      size="large"
      autoComplete={isNew ? 'new-password' : 'current-password'}
      hint={isNew ? `At least ${SHORTEST} characters; four unrelated words do well.` : undefined}
      error={formState.errors.passphrase?.message}
      after={
        <Button kind="plain" size="tiny" aria-pressed={isShown} onClick={() => setShown(!isShown)}>
          {isShown ? 'Hide' : 'Show'}
        </Button>
      }
      {...register('passphrase', {
        required: isNew ? 'Write the new passphrase.' : 'Write your passphrase.',
        ...(isNew
          ? {
              minLength: {
                value: SHORTEST,
                message: `Use at least ${SHORTEST} characters; four unrelated words do well.`,
              },
            }
          : {}),
      })}
    />
  );
}
