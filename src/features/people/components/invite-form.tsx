import { useForm } from 'react-hook-form';
import type { Role } from '#shared/contracts/session.ts';
import { Button } from '#src/components/button.tsx';
import { Field } from '#src/components/field.tsx';
import { Notice } from '#src/components/notice.tsx';
import { Select } from '#src/components/select.tsx';
import { ApiError, sentenceOf } from '#src/lib/api/api-error.ts';
import { showFieldErrors } from '#src/lib/forms/show-field-errors.ts';
import { say } from '#src/lib/sill-store.ts';
import { usePeopleActions } from '../api/people.ts';
import { ROLE_OPTIONS } from '../sentences/people-words.ts';

interface InviteValues {
  readonly name: string;
  readonly email: string;
  readonly role: Role;
}

/** Name, university email, student or advisor; an invitation goes out by mail. */
export function InviteForm({ team }: { readonly team: string }) {
  const { invite } = usePeopleActions(team);
  const { register, handleSubmit, reset, setError, setFocus, formState } = useForm<InviteValues>({
    defaultValues: { name: '', email: '', role: 'member' },
  });
  const { errors } = formState;
  const isAboutField = invite.error instanceof ApiError && Object.keys(invite.error.fields).length > 0;
  const submit = handleSubmit((values) =>
    invite.mutate(values, {
      onSuccess: ({ name }) => {
        say(`${name} is invited. The mail stands below.`);
        reset();
        setFocus('name');
      },
      onError: (failure) => void showFieldErrors(failure, setError, ['name', 'email', 'role']),
    }),
  );
  return (
    <form noValidate aria-label="Invite" onSubmit={(event) => void submit(event)} className="py-4">
      <div className="grid grid-cols-[1fr_1.3fr_160px_auto] items-start gap-4 max-md:grid-cols-1">
        <Field
          label="Name"
          autoComplete="off"
          error={errors.name?.message}
          {...register('name', { required: 'Write the name, as it should stand in the report.' })}
        />
        <Field
          label="University email"
          type="email"
          autoComplete="off"
          error={errors.email?.message}
          {...register('email', {
            required: 'Write the whole address, like ines.farrow@skerry.example.',
            setValueAs: (text: string) => text.trim(),
          })}
        />
        <Select label="Comes as" options={ROLE_OPTIONS} error={errors.role?.message} {...register('role')} />
        <Button type="submit" busy={invite.isPending} className="min-h-10 md:mt-[23px]">
          Invite
        </Button>
      </div>
      {invite.error && !isAboutField && <Notice title={sentenceOf(invite.error)} className="mt-3" />}
    </form>
  );
}
