import { useForm } from 'react-hook-form';
import { Button } from '#src/components/button.tsx';
import { Field } from '#src/components/field.tsx';
import { Notice } from '#src/components/notice.tsx';
import { ApiError, sentenceOf } from '#src/lib/api/api-error.ts';
import { showFieldErrors } from '#src/lib/forms/show-field-errors.ts';
import { say } from '#src/lib/sill-store.ts';
import { useChangePassphrase } from '../api/change-passphrase.ts';

interface PassphraseValues {
  readonly current: string;
  readonly next: string;
}

const SHORTEST = 12;

/** One's own passphrase; every other session of the same person ends. */
export function PassphraseForm() {
  const { mutate, isPending, error } = useChangePassphrase();
  const { register, handleSubmit, reset, setError, formState } = useForm<PassphraseValues>({
    defaultValues: { current: '', next: '' },
  });
  const { errors } = formState;
  const isAboutField = error instanceof ApiError && Object.keys(error.fields).length > 0;
  const submit = handleSubmit((values) =>
    mutate(values, {
      onSuccess: () => {
        reset();
        say('Your passphrase is changed. Other devices are signed out.');
      },
      onError: (failure) => void showFieldErrors(failure, setError, ['current', 'next']),
    }),
  );
  return (
    <form noValidate onSubmit={(event) => void submit(event)} className="grid max-w-[360px] gap-4">
      <Field
        label="Passphrase you use now"
        type="password"
        autoComplete="current-password"
        error={errors.current?.message}
        {...register('current', { required: 'Write the passphrase you use now.' })}
      />
      <Field
        label="New passphrase"
        type="password"
        autoComplete="new-password"
        hint="At least 12 characters; four unrelated words do well."
        error={errors.next?.message}
        {...register('next', {
          minLength: {
            value: SHORTEST,
            message: `Use at least ${SHORTEST} characters; four unrelated words do well.`,
          },
          required: 'Write the new passphrase.',
        })}
      />
      {error && !isAboutField && <Notice title={sentenceOf(error)} />}
      <div>
        <Button type="submit" busy={isPending}>
          Change passphrase
        </Button>
      </div>
    </form>
  );
}
