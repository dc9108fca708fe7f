import { zodResolver } from '@hookform/resolvers/zod';
import { useMemo, useState } from 'react';
import { useFieldArray, useForm } from 'react-hook-form';
import type { Model } from '#shared/evidence/evidence.ts';
import { Button } from '#src/components/button.tsx';
import { Choice, ChoiceGroup } from '#src/components/choice-group.tsx';
import { Field } from '#src/components/field.tsx';
import { Notice } from '#src/components/notice.tsx';
import { Select } from '#src/components/select.tsx';
import { Word } from '#src/components/word.tsx';
import { sentenceOf } from '#src/lib/api/api-error.ts';
import { useDefinition } from '#src/lib/evidence/use-definition.ts';
import { useEvidence } from '#src/lib/evidence/use-evidence.ts';
import { say } from '#src/lib/sill-store.ts';
import {
  comparisonDraft,
  comparisonDraftSchema,
  toComparisonBody,
  type ComparisonDraft,
} from '../view/comparison-draft.ts';

interface ComparisonFormProps {
  readonly model: Model;
  readonly id: string | null;
  readonly onClose: (kept: string | null) => void;
}

/** Which trials a model must stand up to, and what of it they may determine. */
export function ComparisonForm({ model, id, onClose }: ComparisonFormProps) {
  const evidence = useEvidence();
  const before = evidence.comparisons.find((comparison) => comparison.id === id) ?? null;
  const { create, replace, remove } = useDefinition('comparisons');
  const [refusal, setRefusal] = useState<string | null>(null);
  const schema = useMemo(() => comparisonDraftSchema(evidence), [evidence]);
  const { register, control, handleSubmit, formState } = useForm<ComparisonDraft>({
    resolver: zodResolver(schema) as never,
    defaultValues: comparisonDraft(before, evidence),
  });
  const { errors, isSubmitting } = formState;
  const where = useFieldArray({ control, name: 'where' });
  const free = useFieldArray({ control, name: 'free' });
  const attempt = async (work: () => Promise<{ id?: string }>, done: string) => {
    try {
      const answer = await work();
      say(done);
      onClose(answer.id ?? null);
    } catch (error) {
      setRefusal(sentenceOf(error));
    }
  };
  const keep = handleSubmit((draft) => {
    const row = toComparisonBody(draft, model.id, evidence);
    return attempt(() => (id ? replace(id, row) : create(row)), `Compared: ${row.name}.`);
  });
  const words = (ids: (origin: string) => boolean) => [
    { value: '', words: 'choose' },
    ...evidence.quantities.flatMap(({ id: quantity, symbol, name, def }) =>
      ids(def.origin) ? [{ value: quantity, words: `${symbol}, ${name}` }] : [],
    ),
  ];
  const conditions = words((origin) => origin === 'recorded');
  const parameters = words((origin) => origin === 'fitted' || origin === 'constant');
  return (
    <form
      noValidate
      aria-label="Comparison"
      className="page-sheet px-7 pt-6 pb-5 max-sm:px-4"
      onSubmit={(event) => void keep(event)}
    >
      <h2 className="font-report text-[24px]/[30px] font-medium">
        {before ? before.name : `New comparison with model ${model.n}`}
      </h2>
      <div className="mt-4 grid gap-4">
        <Field
          label="Name"
          placeholder="series B, lean varied"
          error={errors.name?.message}
          {...register('name')}
        />
        <ChoiceGroup legend="Series" hint={errors.series?.message}>
          {evidence.series.map((series) => (
            <Choice
              key={series.id}
              kind="checkbox"
              value={series.id}
              words={`${series.letter}, ${series.name}`}
              {...register('series')}
            />
          ))}
        </ChoiceGroup>
        <Field
          label="With these trials besides"
          placeholder="A1, A2"
          error={errors.plusTrials?.message}
          {...register('plusTrials')}
        />
      </div>
      <h3 className="h3 mt-5">Only where</h3>
      {where.fields.map((field, index) => (
        <div key={field.id} className="mt-2 grid grid-cols-[1fr_110px_110px_auto] items-start gap-3">
          <Select
            label="Quantity"
            options={conditions}
            error={errors.where?.[index]?.quantity?.message}
            {...register(`where.${index}.quantity`)}
          />
          <Field
            label="From"
            error={errors.where?.[index]?.min?.message}
            {...register(`where.${index}.min`)}
          />
          <Field label="To" error={errors.where?.[index]?.max?.message} {...register(`where.${index}.max`)} />
          <Word className="mt-8 text-xs" onClick={() => where.remove(index)}>
            Remove
          </Word>
        </div>
      ))}
      <p className="mt-2 text-sm">
        <Word onClick={() => where.append({ quantity: '', min: '', max: '' })}>Add a condition</Word>
      </p>
      <h3 className="h3 mt-5">Free, found by these trials</h3>
      {free.fields.map((field, index) => (
        <div
          key={field.id}
          className="mt-2 grid grid-cols-[1fr_90px_90px_90px_auto] items-start gap-3 max-sm:grid-cols-2"
        >
          <Select
            label="Parameter"
            options={parameters}
            error={errors.free?.[index]?.quantity?.message}
            {...register(`free.${index}.quantity`)}
          />
          <Field
            label="Begin at"
            error={errors.free?.[index]?.start?.message}
            {...register(`free.${index}.start`)}
          />
          <Field
            label="At least"
            error={errors.free?.[index]?.min?.message}
            {...register(`free.${index}.min`)}
          />
          <Field
            label="At most"
            error={errors.free?.[index]?.max?.message}
            {...register(`free.${index}.max`)}
          />
          <Word className="mt-8 text-xs" onClick={() => free.remove(index)}>
            Remove
          </Word>
        </div>
      ))}
      <p className="mt-2 text-sm">
        <Word onClick={() => free.append({ quantity: '', start: '', min: '', max: '' })}>
          Free a parameter
        </Word>
      </p>
      <ChoiceGroup legend="Uncertainties of the trials are">
        <Choice kind="radio" value="absolute" words="believed, and tested by χ²" {...register('weights')} />
        <Choice
          kind="radio"
          value="relative"
          words="taken from how far the trials lie from the fit"
          {...register('weights')}
        />
      </ChoiceGroup>
      {refusal && (
        <Notice title="Not kept." className="mt-3">
          {refusal}
        </Notice>
      )}
      <div className="mt-4 flex flex-wrap gap-2.5">
        <Button type="submit" kind="main" busy={isSubmitting}>
          {before ? 'Keep the change' : 'Compare'}
        </Button>
        <Button kind="plain" onClick={() => onClose(null)}>
          Leave it
        </Button>
        {before && (
          <Button
            kind="risk"
            onClick={() =>
              void attempt(() => remove(before.id) as Promise<{ id?: string }>, `${before.name} is removed.`)
            }
          >
            Remove
          </Button>
        )}
      </div>
    </form>
  );
}
