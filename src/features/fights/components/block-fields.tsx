import { useFieldArray, type UseFormReturn } from 'react-hook-form';
import { Field } from '#src/components/field.tsx';
import { Select } from '#src/components/select.tsx';
import { Word } from '#src/components/word.tsx';
import { FLOOR_WORDS } from '../sentences/event-words.ts';
import type { EventFormValues } from './event-form-values.ts';

const FLOORS = Object.entries(FLOOR_WORDS).map(([value, words]) => ({ value, words }));

/** The blocks of a stage; one of them is the report. */
export function BlockFields({ form }: { readonly form: UseFormReturn<EventFormValues> }) {
  const { register, control, formState, getValues, setValue } = form;
  const { fields, append, remove } = useFieldArray({ control, name: 'blocks' });
  /** The report stays the same block, wherever it stands then. */
  const take = (index: number) => {
    const report = Number(getValues('report'));
    remove(index);
    setValue('report', index === report ? '' : String(index < report ? report - 1 : report));
  };
  return (
    <fieldset>
      <legend className="mb-1 font-report text-lg font-medium">Blocks of a stage</legend>
      {fields.map((field, index) => {
        const errors = formState.errors.blocks?.[index];
        return (
          <div
            key={field.id}
            role="group"
            aria-label={`Block ${index + 1}`}
            className="grid grid-cols-2 items-end gap-3 border-b border-hair py-2.5 sm:grid-cols-[1.8fr_1.2fr_84px_84px_auto_auto]"
          >
            <Field
              label="Block"
              frameClassName="max-sm:col-span-2"
              error={errors?.name?.message}
              {...register(`blocks.${index}.name`)}
            />
            <Select
              label="Has the floor"
              options={FLOORS}
              frameClassName="max-sm:col-span-2"
              {...register(`blocks.${index}.floor`)}
            />
            <Field
              label="From minute"
              inputMode="decimal"
              error={errors?.from?.message}
              {...register(`blocks.${index}.from`)}
            />
            <Field
              label="To minute"
              inputMode="decimal"
              error={errors?.to?.message}
              {...register(`blocks.${index}.to`)}
            />
            <label className="mb-2 flex min-h-6 items-center gap-1.5 text-sm">
              <input type="radio" value={String(index)} {...register('report')} />
              the report
            </label>
            <Word className="mb-2 justify-self-start" onClick={() => take(index)}>
              Remove<span className="sr-only"> block {index + 1}</span>
            </Word>
          </div>
        );
      })}
      <Word
        className="mt-3"
        onClick={() => {
          const from = getValues('blocks').at(-1)?.to ?? '0';
          append({ name: '', floor: 'reporter', from, to: '' });
        }}
      >
        Add a block
      </Word>
    </fieldset>
  );
}
