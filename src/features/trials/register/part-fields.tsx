import type { FieldErrors, FieldValues, UseFormRegister } from 'react-hook-form';
import type { UncertaintyPart } from '#shared/evidence/evidence.ts';
import { Choice } from '#src/components/choice-group.tsx';
import { Field } from '#src/components/field.tsx';
import { Select } from '#src/components/select.tsx';
import { Word } from '#src/components/word.tsx';

const KINDS = [
  { value: 'resolution', words: 'resolution, the smallest step' },
  { value: 'offset', words: 'offset, as of a zero' },
  { value: 'scale', words: 'scale, relative' },
  { value: 'stated', words: 'stated, from a certificate or judgement' },
] as const;
const SHAPES = [
  { value: 'rectangular', words: 'anywhere within ±, evenly' },
  { value: 'triangular', words: 'within ±, most likely the middle' },
  { value: 'arcsine', words: 'within ±, most likely the ends' },
  { value: 'normal', words: 'normal, given with k' },
] as const;

export interface PartsForm extends FieldValues {
  parts: UncertaintyPart[];
}

export const NEW_PART: UncertaintyPart = {
  kind: 'resolution',
  amount: '',
  unit: '',
  shape: 'rectangular',
  shared: false,
};

/** One stated part of an uncertainty, in a form that has a list of them. */
export function PartFields({
  index,
  register,
  errors,
  onRemove,
}: {
  readonly index: number;
  readonly register: UseFormRegister<PartsForm>;
  readonly errors: FieldErrors<PartsForm>;
  readonly onRemove: () => void;
}) {
  const wrong = errors.parts?.[index];
  return (
    <fieldset className="mt-3 grid grid-cols-2 gap-x-3 gap-y-2.5 border-l-[1.25px] border-ink-3 pl-3">
      <legend className="sr-only">Part {index + 1} of the uncertainty</legend>
      <Select label="Part" frameClassName="col-span-2" options={KINDS} {...register(`parts.${index}.kind`)} />
      <Field
        label="Amount"
        inputMode="decimal"
        error={wrong?.amount?.message}
        {...register(`parts.${index}.amount`)}
      />
      <Field label="Unit" hint="empty for a relative one" {...register(`parts.${index}.unit`)} />
      <Select
        label="How the error may lie"
        frameClassName="col-span-2"
        options={SHAPES}
        {...register(`parts.${index}.shape`)}
      />
      <Field
        label="k, if normal"
        inputMode="decimal"
        {...register(`parts.${index}.k`, {
          setValueAs: (text: unknown) =>
            text === '' || text === undefined || text === null ? undefined : Number(text),
        })}
        error={wrong?.k ? 'k is a number above 0, as 1 or 2.' : undefined}
      />
      <Field
        label="Why"
        {...register(`parts.${index}.reason`, { setValueAs: (text: unknown) => text || undefined })}
      />
      <div className="col-span-2 text-xs">
        <Choice
          kind="checkbox"
          words="the same error in every reading"
          {...register(`parts.${index}.shared`)}
        />
        <Choice
          kind="checkbox"
          words="not in the scatter of repeats"
          {...register(`parts.${index}.notInScatter`)}
        />
      </div>
      <p className="text-xs">
        <Word onClick={onRemove}>Remove this part</Word>
      </p>
    </fieldset>
  );
}
