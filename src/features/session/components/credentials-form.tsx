import { useEffect, useState, type ReactNode } from 'react';
import { useForm } from 'react-hook-form';
import { Button } from '#src/components/button.tsx';
import { Field } from '#src/components/field.tsx';
import { Notice } from '#src/components/notice.tsx';
import { sentenceOf } from '#src/lib/api/api-error.ts';
import { useStartSession, type Credentials } from '../api/start-session.ts';

interface CredentialsFormProps {
  /** The address of who signs in again; it cannot be another one. */
  readonly email?: string | undefined;
  /** What stands between the fields and the button, and beside it. */
  readonly beside?: ReactNode;
  readonly onSignedIn: (userId: string) => void;
}

const LIKE_AN_ADDRESS = /^\S+@\S+\.\S+$/;

/** Address and passphrase. */
export function CredentialsForm({ email, beside, onSignedIn }: CredentialsFormProps) {
  const [isShown, setShown] = useState(false);
  const { mutate, isPending, error } = useStartSession();
  const { register, handleSubmit, setFocus, formState } = useForm<Credentials>({
    defaultValues: { email: email ?? '', passphrase: '' },
  });
  const { errors } = formState;
  useEffect(() => {
    if (email !== undefined) setFocus('passphrase');
  }, [email, setFocus]);
  const submit = handleSubmit((credentials) =>
    mutate(credentials, { onSuccess: ({ user }) => onSignedIn(user.id) }),
  );
  return (
    <form noValidate onSubmit={(event) => void submit(event)} className="grid gap-4">
      <Field
        label="University email"
        type="email"
        size="large"
        autoComplete="username"
        readOnly={email !== undefined}
        error={errors.email?.message}
        {...register('email', {
          validate: (text) =>
            LIKE_AN_ADDRESS.test(text.trim()) || 'Write the whole address, like ines.farrow@skerry.example.',
          setValueAs: (text: string) => text.trim(),
        })}
      />
      <Field
        label="Passphrase"
        type={isShown ? 'text' : 'password'}
        size="large"
        autoComplete="current-password"
        error={errors.passphrase?.message}
        after={
          <Button kind="plain" size="tiny" aria-pressed={isShown} onClick={() => setShown(!isShown)}>
            {isShown ? 'Hide' : 'Show'}
          </Button>
        }
        {...register('passphrase', { required: 'Write your passphrase.' })}
      />
      {error && <Notice title={sentenceOf(error)} />}
      <div className={beside === undefined ? 'grid' : 'flex justify-end gap-2.5'}>
        {beside}
        <Button
          kind="main"
          type="submit"
          busy={isPending}
          className={beside === undefined ? 'min-h-12 text-[16px]' : undefined}
        >
          {isPending ? 'Signing in' : 'Sign in'}
        </Button>
      </div>
    </form>
  );
}
