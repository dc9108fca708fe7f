import { zodResolver } from '@hookform/resolvers/zod';
import { Controller, useForm } from 'react-hook-form';
import { useQueryClient } from '@tanstack/react-query';
import { Button } from '#src/components/button.tsx';
import { Field } from '#src/components/field.tsx';
import { Notice } from '#src/components/notice.tsx';
import { TextArea } from '#src/components/text-area.tsx';
import { Word } from '#src/components/word.tsx';
import { ApiError, sentenceOf } from '#src/lib/api/api-error.ts';
import { showFieldErrors } from '#src/lib/forms/show-field-errors.ts';
import { useProblem } from '#src/lib/problem/problem-context.ts';
import { say } from '#src/lib/sill-store.ts';
import { problemQuery } from '../api/get-problem.ts';
import { useUpdateProblem } from '../api/update-problem.ts';
import { JudgingFields } from './judging-fields.tsx';
import { OwnersField } from './owners-field.tsx';
import { settingsForm, toProblemChange, toSettingsValues, type SettingsValues } from './problem-form.ts';
import { TasksField } from './tasks-field.tsx';

/** Read-only for advisors: every control is there, and none can be changed. */
export function ProblemSettingsForm() {
  const { address, team, problem, mayWrite } = useProblem();
  const client = useQueryClient();
  const update = useUpdateProblem(address, problem.rowVersion);
  const { register, control, handleSubmit, reset, setError, formState } = useForm<SettingsValues>({
    resolver: zodResolver(settingsForm),
    defaultValues: toSettingsValues(problem),
  });
  const { errors } = formState;
  const isOvertaken = update.error instanceof ApiError && update.error.code === 'changed-meanwhile';

  const submit = handleSubmit((values) =>
    update.mutate(toProblemChange(values), {
      onSuccess: (kept) => {
        reset(toSettingsValues(kept));
        say(`Settings of ${kept.title} are kept.`);
      },
      onError: (error) => void showFieldErrors(error, setError, ['title', 'statement', 'k', 'level']),
    }),
  );
  const takeTheirs = async () => {
    reset(toSettingsValues(await client.query({ ...problemQuery(address), staleTime: 0 })));
    update.reset();
  };

  return (
    <form noValidate onSubmit={(event) => void submit(event)} className="page-sheet mt-6 px-5 py-6 sm:px-7">
      <fieldset disabled={!mayWrite} className="grid min-w-0 gap-5">
        <Field label="Short name" error={errors.title?.message} {...register('title')} />
        <TextArea
          label="The task, as it was set"
          rows={5}
          className="font-report text-report"
          error={errors.statement?.message}
          {...register('statement')}
        />
        <Controller
          control={control}
          name="tasks"
          render={({ field }) => (
            <TasksField
              tasks={field.value}
              isReadOnly={!mayWrite}
              hint="A question that is added becomes a claim. The claim of one that is removed stays, as a claim of its own."
              errors={field.value.map((_, index) => errors.tasks?.[index]?.text?.message)}
              onChange={field.onChange}
            />
          )}
        />
        <OwnersField people={team.people} registration={register('owners')} />
        <JudgingFields register={register} errors={errors} />
      </fieldset>
      {update.error && (
        <Notice title={sentenceOf(update.error)} className="mt-5">
          {isOvertaken && <Word onClick={() => void takeTheirs()}>Show what stands there now</Word>}
        </Notice>
      )}
      {mayWrite && (
        <div className="mt-5 flex justify-end gap-2.5">
          <Button kind="plain" disabled={!formState.isDirty} onClick={() => reset()}>
            Put back
          </Button>
          <Button kind="main" type="submit" busy={update.isPending}>
            Keep settings
          </Button>
        </div>
      )}
    </form>
  );
}
