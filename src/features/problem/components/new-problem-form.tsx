import { zodResolver } from '@hookform/resolvers/zod';
import { useState } from 'react';
import { Controller, useForm } from 'react-hook-form';
import { useNavigate } from 'react-router-dom';
import type { Team } from '#shared/contracts/teams.ts';
import { Button } from '#src/components/button.tsx';
import { Field } from '#src/components/field.tsx';
import { Notice } from '#src/components/notice.tsx';
import { TextArea } from '#src/components/text-area.tsx';
import { ApiError, sentenceOf } from '#src/lib/api/api-error.ts';
import { showFieldErrors } from '#src/lib/forms/show-field-errors.ts';
import { paths } from '#src/lib/paths.ts';
import { say } from '#src/lib/sill-store.ts';
import { useCreateProblem } from '../api/create-problem.ts';
import { OwnersField } from './owners-field.tsx';
import { newProblemForm, toNewProblem, type NewProblemValues } from './problem-form.ts';
import { proposeTasks } from './propose-tasks.ts';
import { TasksField } from './tasks-field.tsx';

/** The statement is pasted; what it asks is read from it, until somebody edits that. */
export function NewProblemForm({ team }: { readonly team: Team }) {
  const navigate = useNavigate();
  const create = useCreateProblem(team.slug);
  const [areTasksOwn, setTasksOwn] = useState(false);
  const { register, control, handleSubmit, setValue, setError, formState } = useForm<NewProblemValues>({
    resolver: zodResolver(newProblemForm),
    defaultValues: { number: '', title: '', statement: '', tasks: [], owners: [] },
  });
  const { errors } = formState;

  const propose = (statement: string) => {
    if (areTasksOwn) return;
    setValue(
      'tasks',
      proposeTasks(statement).map((text) => ({ id: crypto.randomUUID(), text })),
    );
  };

  const submit = handleSubmit((values) =>
    create.mutate(toNewProblem(values), {
      onSuccess: ({ number }) => {
        say(`Problem ${number}, ${values.title}, is here. Its first trial can be logged.`);
        void navigate(paths.station({ team: team.slug, number }, 'trials'));
      },
      onError: (error) => {
        if (error instanceof ApiError && error.code === 'number-taken') {
          setError('number', { type: 'server', message: error.message }, { shouldFocus: true });
        } else showFieldErrors(error, setError, ['number', 'title', 'statement']);
      },
    }),
  );

  return (
    <form
      noValidate
      onSubmit={(event) => void submit(event)}
      className="page-sheet mt-6 grid gap-5 px-5 py-6 sm:px-7"
    >
      <div className="grid gap-4 sm:grid-cols-[120px_1fr]">
        <Field label="Number" inputMode="numeric" error={errors.number?.message} {...register('number')} />
        <Field label="Short name" error={errors.title?.message} {...register('title')} />
      </div>
      <TextArea
        label="The task, as it was set"
        rows={5}
        className="font-report text-report"
        error={errors.statement?.message}
        {...register('statement', {
          onChange: (event: { target: { value: string } }) => propose(event.target.value),
        })}
      />
      <Controller
        control={control}
        name="tasks"
        render={({ field }) => (
          <TasksField
            tasks={field.value}
            hint="Read from the task; change them as you like. Each becomes a claim that stays undecided until you choose how to test it."
            errors={field.value.map((_, index) => errors.tasks?.[index]?.text?.message)}
            onChange={(tasks) => {
              setTasksOwn(true);
              field.onChange(tasks);
            }}
          />
        )}
      />
      <OwnersField people={team.people} registration={register('owners')} />
      {create.error && <Notice title={sentenceOf(create.error)} />}
      <div className="flex justify-end gap-2.5">
        <Button kind="plain" onClick={() => void navigate(paths.season(team.slug))}>
          Leave it
        </Button>
        <Button kind="main" type="submit" busy={create.isPending}>
          Begin problem
        </Button>
      </div>
    </form>
  );
}
