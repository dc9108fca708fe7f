import type { Control, FieldErrors, UseFormRegister } from 'react-hook-form';
import { Field } from '#src/components/field.tsx';
import { Select } from '#src/components/select.tsx';
import { useEvidence } from '#src/lib/evidence/use-evidence.ts';
import type { Origin, QuantityDraft } from './quantity-draft.ts';
import { SummaryFields } from './summary-fields.tsx';

interface OriginFieldsProps {
  readonly origin: Origin;
  readonly control: Control<QuantityDraft>;
  readonly register: UseFormRegister<QuantityDraft>;
  readonly errors: FieldErrors<QuantityDraft>;
}

/** What else must be said, by how the quantity comes by its value. */
export function OriginFields({ origin, control, register, errors }: OriginFieldsProps) {
  const { comparisons, models } = useEvidence();
  switch (origin) {
    case 'recorded':
      return <InstrumentSelect register={register} />;
    case 'constant':
      return (
        <>
          <Field
            label="Value"
            placeholder="12.0 ± 0.1"
            hint="empty: named, not measured"
            error={errors.reading?.message}
            {...register('reading')}
          />
          <InstrumentSelect register={register} />
        </>
      );
    case 'derived':
      return (
        <Field
          label="Worked out as"
          placeholder="C_v^2*h"
          frameClassName="col-span-2"
          className="font-code"
          spellCheck={false}
          error={errors.expr?.message}
          {...register('expr')}
        />
      );
    case 'fitted':
      return (
        <Select
          label="By the comparison"
          frameClassName="col-span-2"
          options={[none, ...comparisons.map(({ id, name }) => ({ value: id, words: name }))]}
          error={errors.from?.message}
          {...register('from')}
        />
      );
    case 'predicted':
      return (
        <Select
          label="By the model"
          frameClassName="col-span-2"
          options={[
            none,
            ...models.map(({ id, n, name }) => ({
              value: id,
              words: `model ${n}${name ? `, ${name}` : ''}`,
            })),
          ]}
          error={errors.from?.message}
          {...register('from')}
        />
      );
    case 'summary':
      return <SummaryFields control={control} register={register} errors={errors} />;
  }
}

const none = { value: '', words: 'choose' };

function InstrumentSelect({ register }: Pick<OriginFieldsProps, 'register'>) {
  const { instruments } = useEvidence();
  return (
    <Select
      label="Read with"
      options={[
        { value: '', words: 'no instrument named' },
        ...instruments.map(({ id, name }) => ({ value: id, words: name })),
      ]}
      {...register('instrument')}
    />
  );
}
