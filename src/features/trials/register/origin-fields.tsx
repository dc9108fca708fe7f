import type { FieldErrors, UseFormRegister } from 'react-hook-form';
import { statisticSchema } from '#shared/evidence/evidence.ts';
import { Field } from '#src/components/field.tsx';
import { Select } from '#src/components/select.tsx';
import { useEvidence } from '#src/lib/evidence/use-evidence.ts';
import type { Origin, QuantityDraft } from './quantity-draft.ts';

interface OriginFieldsProps {
  readonly origin: Origin;
  readonly register: UseFormRegister<QuantityDraft>;
  readonly errors: FieldErrors<QuantityDraft>;
}

const STATISTICS = statisticSchema.options
  .filter((stat) => stat !== 'slope')
  .map((value) => ({ value, words: value }));

/** What else must be said, by how the quantity comes by its value. */
export function OriginFields({ origin, register, errors }: OriginFieldsProps) {
  const { comparisons, models, quantities, series } = useEvidence();
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
      return (
        <>
          <Select label="Statistic" options={STATISTICS} {...register('stat')} />
          <Select
            label="Of"
            options={[
              none,
              ...quantities
                .filter(({ def }) => def.origin === 'recorded' || def.origin === 'derived')
                .map(({ id, name }) => ({ value: id, words: name })),
            ]}
            error={errors.from?.message}
            {...register('from')}
          />
          <Select
            label="Over the series"
            frameClassName="col-span-2"
            options={[
              none,
              ...series.map(({ id, letter, name }) => ({ value: id, words: `${letter}, ${name}` })),
            ]}
            error={errors.series?.message}
            {...register('series')}
          />
        </>
      );
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
