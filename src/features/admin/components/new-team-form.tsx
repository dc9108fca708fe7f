import { useForm, type FieldPath } from 'react-hook-form';
import { Button } from '#src/components/button.tsx';
import { Field } from '#src/components/field.tsx';
import { Notice } from '#src/components/notice.tsx';
import { ApiError, sentenceOf } from '#src/lib/api/api-error.ts';
import { showFieldErrors } from '#src/lib/forms/show-field-errors.ts';
import { say } from '#src/lib/sill-store.ts';
import { useAdminActions } from '../api/admin.ts';

interface NewTeamValues {
  readonly name: string;
  readonly university: string;
  readonly season: { readonly from: string; readonly to: string };
  readonly captain: { readonly name: string; readonly email: string };
}

const EMPTY: NewTeamValues = {
  name: '',
  university: '',
  season: { from: '', to: '' },
  captain: { name: '', email: '' },
};
const FIELDS: readonly {
  readonly name: Exclude<FieldPath<NewTeamValues>, 'season' | 'captain'>;
  readonly label: string;
  readonly type?: 'date' | 'email';
  readonly needed: string;
}[] = [
  { name: 'name', label: 'Name of the team', needed: 'Write the name of the team.' },
  { name: 'university', label: 'University', needed: 'Write the name of the university.' },
  { name: 'season.from', label: 'Season begins', type: 'date', needed: 'Choose the first day.' },
  { name: 'season.to', label: 'Season ends', type: 'date', needed: 'Choose the last day.' },
  { name: 'captain.name', label: 'Name of its captain', needed: 'Write the name of the captain.' },
  {
    name: 'captain.email',
    label: 'Email of its captain',
    type: 'email',
    needed: 'Write the whole address, like ines.farrow@skerry.example.',
  },
];

/** Opens a team; its captain is invited by mail and takes it from there. */
export function NewTeamForm() {
  const { createTeam } = useAdminActions();
  const { register, handleSubmit, reset, setError, getFieldState, formState } = useForm<NewTeamValues>({
    defaultValues: EMPTY,
  });
  const names = FIELDS.map(({ name }) => name);
  const { error } = createTeam;
  const isAboutField = error instanceof ApiError && names.some((name) => error.fields[name] !== undefined);
  const submit = handleSubmit((values) =>
    createTeam.mutate(values, {
      onSuccess: ({ name }) => {
        say(`${name} is open. Its captain is invited.`);
        reset();
      },
      onError: (failure) => void showFieldErrors(failure, setError, names),
    }),
  );
  return (
    <form noValidate aria-label="Open a team" onSubmit={(event) => void submit(event)} className="py-5">
      <h3 className="mb-3 font-report text-[19px]/6 font-medium">Open a team</h3>
      <div className="grid grid-cols-2 gap-4 max-md:grid-cols-1">
        {FIELDS.map(({ name, label, type, needed }) => (
          <Field
            key={name}
            label={label}
            type={type ?? 'text'}
            autoComplete="off"
            error={getFieldState(name, formState).error?.message}
            {...register(name, { required: needed })}
          />
        ))}
      </div>
      {error && !isAboutField && <Notice title={sentenceOf(error)} className="mt-3" />}
      <Button type="submit" kind="main" busy={createTeam.isPending} className="mt-4">
        Open the team
      </Button>
    </form>
  );
}
