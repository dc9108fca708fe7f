import { useWatch, type Control, type FieldErrors, type UseFormRegister } from 'react-hook-form';
import { statisticSchema } from '#shared/evidence/evidence.ts';
import { Select } from '#src/components/select.tsx';
import { useEvidence } from '#src/lib/evidence/use-evidence.ts';
import type { QuantityDraft } from './quantity-draft.ts';

interface SummaryFieldsProps {
  readonly control: Control<QuantityDraft>;
  readonly register: UseFormRegister<QuantityDraft>;
  readonly errors: FieldErrors<QuantityDraft>;
}

const none = { value: '', words: 'choose' };
const STATISTICS = statisticSchema.options.map((value) => ({ value, words: value }));
const SCATTERS = [
  { value: 'group', words: 'these trials alone' },
  { value: 'pooled', words: 'all settings, pooled' },
];

/** Which statistic of which column over which trials, and what that statistic needs besides. */
export function SummaryFields({ control, register, errors }: SummaryFieldsProps) {
  const { quantities, series } = useEvidence();
  const stat = useWatch({ control, name: 'stat' });
  const columns = quantities
    .filter(({ def }) => def.origin === 'recorded' || def.origin === 'derived')
    .map(({ id, name }) => ({ value: id, words: name }));
  return (
    <>
      <Select label="Statistic" options={STATISTICS} {...register('stat')} />
      <Select label="Of" options={[none, ...columns]} error={errors.from?.message} {...register('from')} />
      {stat === 'slope' && (
        <Select
          label="Against"
          frameClassName="col-span-2"
          options={[none, ...columns]}
          error={errors.against?.message}
          {...register('against')}
        />
      )}
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
      {(stat === 'mean' || stat === 'median') && (
        <Select
          label="Scatter from"
          frameClassName="col-span-2"
          options={SCATTERS}
          {...register('scatter')}
        />
      )}
    </>
  );
}
