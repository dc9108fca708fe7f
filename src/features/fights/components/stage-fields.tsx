import { useFieldArray, type UseFormReturn } from 'react-hook-form';
import type { Person, ProblemSummary } from '#shared/contracts/teams.ts';
import { Field } from '#src/components/field.tsx';
import { Select } from '#src/components/select.tsx';
import { Word } from '#src/components/word.tsx';
import type { FightFormValues } from './fight-form-values.ts';

interface StageFieldsProps {
  readonly form: UseFormReturn<FightFormValues>;
  readonly problems: readonly ProblemSummary[];
  readonly people: readonly Person[];
}

const ROLES = [
  { value: 'report', words: 'we report' },
  { value: 'oppose', words: 'we oppose' },
  { value: 'review', words: 'we review' },
] as const;
const MOST_STAGES = 12;

/** The stages of a fight, one below the other. */
export function StageFields({ form, problems, people }: StageFieldsProps) {
  const { register, control, formState } = form;
  const { fields, append, remove } = useFieldArray({ control, name: 'stages' });
  const students = people.filter(({ role }) => role !== 'advisor');
  return (
    <fieldset>
      <legend className="mb-2 font-report text-lg font-medium">Stages</legend>
      {fields.length === 0 && (
        <p className="font-report text-report text-ink-3 italic">Which problem, and what do we do with it?</p>
      )}
      {fields.map((field, index) => {
        const errors = formState.errors.stages?.[index];
        return (
          <div
            key={field.id}
            role="group"
            aria-label={`Stage ${index + 1}`}
            className="grid items-end gap-3 border-b border-hair py-3 sm:grid-cols-[1fr_1.5fr_1.3fr_1.3fr_auto]"
          >
            <Select
              label={`In stage ${index + 1}`}
              options={ROLES}
              error={errors?.role?.message}
              {...register(`stages.${index}.role`)}
            />
            <Select
              label="Problem"
              options={[
                { value: '', words: 'choose one' },
                ...problems.map(({ number, title }) => ({
                  value: String(number),
                  words: `${number} ${title}`,
                })),
              ]}
              error={errors?.problem?.message}
              {...register(`stages.${index}.problem`)}
            />
            <Field
              label="The other team"
              error={errors?.against?.message}
              {...register(`stages.${index}.against`)}
            />
            <Select
              label="Takes the stage"
              options={[
                { value: '', words: 'not yet said' },
                ...students.map(({ id, name }) => ({ value: id, words: name })),
              ]}
              error={errors?.person?.message}
              {...register(`stages.${index}.person`)}
            />
            <Word className="mb-2 justify-self-start" onClick={() => remove(index)}>
              Remove<span className="sr-only"> stage {index + 1}</span>
            </Word>
          </div>
        );
      })}
      {fields.length < MOST_STAGES && (
        <Word
          className="mt-3"
          onClick={() => append({ role: 'report', problem: '', against: '', person: '' })}
        >
          Add a stage
        </Word>
      )}
    </fieldset>
  );
}
