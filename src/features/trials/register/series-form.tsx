import { zodResolver } from '@hookform/resolvers/zod';
import { useMemo, useState } from 'react';
import { useForm, useWatch } from 'react-hook-form';
import { Button } from '#src/components/button.tsx';
import { Field } from '#src/components/field.tsx';
import { Notice } from '#src/components/notice.tsx';
import { QuantitySymbol } from '#src/components/quantity-symbol.tsx';
import { sentenceOf } from '#src/lib/api/api-error.ts';
import { useDefinition } from '#src/lib/evidence/use-definition.ts';
import { useEvidence } from '#src/lib/evidence/use-evidence.ts';
import { say } from '#src/lib/sill-store.ts';
import { seriesDraft, seriesDraftSchema, toSeriesBody, type SeriesDraft } from './series-draft.ts';

const ROLES = [
  { value: 'not used', words: 'not used' },
  { value: 'held', words: 'held fixed at' },
  { value: 'setting', words: 'set from trial to trial' },
  { value: 'reading', words: 'read in each trial' },
] as const;

/** A series: what is held, what is set from trial to trial, what is read. */
export function SeriesForm({ id, onClose }: { readonly id: string | null; readonly onClose: () => void }) {
  const evidence = useEvidence();
  const before = evidence.series.find((series) => series.id === id) ?? null;
  const recorded = evidence.quantities.filter(({ def }) => def.origin === 'recorded');
  const { create, replace, remove } = useDefinition('series');
  const [refusal, setRefusal] = useState<string | null>(null);
  const schema = useMemo(() => seriesDraftSchema(evidence), [evidence]);
  const { register, control, handleSubmit, formState } = useForm<SeriesDraft>({
    resolver: zodResolver(schema) as never,
    defaultValues: seriesDraft(before, evidence),
  });
  const { errors, isSubmitting } = formState;
  const parts = useWatch({ control, name: 'parts' });
  const attempt = async (work: () => Promise<unknown>, done: string) => {
    try {
      await work();
      say(done);
      onClose();
    } catch (error) {
      setRefusal(sentenceOf(error));
    }
  };
  const keep = handleSubmit((draft) => {
    const row = toSeriesBody(draft, evidence);
    return attempt(
      () => (id ? replace(id, row) : create(row)),
      id ? `Series ${before?.letter ?? ''} is changed.` : 'The series is ready for its first trial.',
    );
  });
  return (
    <form
      noValidate
      aria-label={before ? `Change series ${before.letter}` : 'New series'}
      className="border-b border-rule px-7 py-5 max-sm:px-4"
      onSubmit={(event) => void keep(event)}
    >
      <h2 className="h3">{before ? `Series ${before.letter}` : 'New series'}</h2>
      <div className="mt-3 grid grid-cols-2 gap-3 max-sm:grid-cols-1">
        <Field
          label="What it does"
          placeholder="lean varied at one head"
          error={errors.name?.message}
          {...register('name')}
        />
        <Field label="Rig" placeholder="rig 1" {...register('rig')} />
      </div>
      <fieldset className="mt-4">
        <legend className="text-xs font-[550] text-ink-2">What each quantity is in this series</legend>
        {recorded.map(({ id: quantity, name, symbol, unit }) => (
          <div key={quantity} className="flex flex-wrap items-start gap-3 border-b border-hair py-2 text-sm">
            <span className="w-48 pt-2">
              <QuantitySymbol symbol={symbol} /> {name}
            </span>
            <select
              aria-label={`${name} is`}
              className="h-10 rounded-md border-[1.25px] border-edge bg-paper px-2.5"
              {...register(`parts.${quantity}.as`)}
            >
              {ROLES.map(({ value, words }) => (
                <option key={value} value={value}>
                  {words}
                </option>
              ))}
            </select>
            {parts[quantity]?.as === 'held' && (
              <Field
                label={<span className="sr-only">{name} is held at</span>}
                frameClassName="w-48 -mt-[23px]"
                placeholder={`20.0 ± 0.1 ${unit === '1' ? '' : unit}`}
                error={errors.parts?.[quantity]?.held?.message}
                {...register(`parts.${quantity}.held`)}
              />
            )}
          </div>
        ))}
      </fieldset>
      {typeof errors.parts?.message === 'string' && (
        <p className="mt-2 text-xs text-leak">{errors.parts.message}</p>
      )}
      {refusal && (
        <Notice title="Not kept." className="mt-3">
          {refusal}
        </Notice>
      )}
      <div className="mt-4 flex flex-wrap items-center gap-2.5">
        <Button type="submit" kind="main" busy={isSubmitting}>
          {id ? 'Keep the change' : 'Begin the series'}
        </Button>
        <Button kind="plain" onClick={onClose}>
          Leave it
        </Button>
        {before && (
          <Button
            kind="risk"
            onClick={() => void attempt(() => remove(before.id), `Series ${before.letter} is removed.`)}
          >
            Remove
          </Button>
        )}
      </div>
    </form>
  );
}
