import type { FieldErrors, UseFormRegister } from 'react-hook-form';
import { Field } from '#src/components/field.tsx';
import { Select } from '#src/components/select.tsx';
import { Word } from '#src/components/word.tsx';
import type { ModelDraft } from '../view/model-draft.ts';

interface LimitFieldsProps {
  readonly index: number;
  readonly register: UseFormRegister<ModelDraft>;
  readonly errors: FieldErrors<ModelDraft>;
  readonly quantities: readonly { readonly value: string; readonly words: string }[];
  readonly onRemove: () => void;
}

/** One range inside which the model may be used; an empty end is open. */
export function LimitFields({ index, register, errors, quantities, onRemove }: LimitFieldsProps) {
  const wrong = errors.limits?.[index];
  return (
    <fieldset className="mt-2.5 grid grid-cols-2 gap-3">
      <legend className="sr-only">Range {index + 1}</legend>
      <Select
        label="Quantity"
        frameClassName="col-span-2"
        options={quantities}
        error={wrong?.quantity?.message}
        {...register(`limits.${index}.quantity`)}
      />
      <Field
        label="From"
        inputMode="decimal"
        error={wrong?.min?.message}
        {...register(`limits.${index}.min`)}
      />
      <Field
        label="To"
        inputMode="decimal"
        error={wrong?.max?.message}
        {...register(`limits.${index}.max`)}
      />
      <Field
        label="Because"
        placeholder="below 4 cm the jet clings"
        frameClassName="col-span-2"
        {...register(`limits.${index}.reason`)}
      />
      <p className="col-span-2 text-xs">
        <Word onClick={onRemove}>Remove</Word>
      </p>
    </fieldset>
  );
}
