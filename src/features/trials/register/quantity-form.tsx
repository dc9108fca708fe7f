import { zodResolver } from '@hookform/resolvers/zod';
import { useMemo, useState } from 'react';
import { useForm, useWatch } from 'react-hook-form';
import { Button } from '#src/components/button.tsx';
import { Field } from '#src/components/field.tsx';
import { Notice } from '#src/components/notice.tsx';
import { Select } from '#src/components/select.tsx';
import { ApiError, sentenceOf } from '#src/lib/api/api-error.ts';
import { useDefinition } from '#src/lib/evidence/use-definition.ts';
import { useEvidence } from '#src/lib/evidence/use-evidence.ts';
import { say } from '#src/lib/sill-store.ts';
import { OriginFields } from './origin-fields.tsx';
import {
  draftOf,
  emptyDraft,
  ORIGINS,
  quantityDraftSchema,
  toQuantityBody,
  usualStatus,
  type Origin,
  type QuantityDraft,
} from './quantity-draft.ts';

const ORIGIN_OPTIONS = Object.entries(ORIGINS).map(([value, words]) => ({ value, words }));
const STATUS_OPTIONS = ['measured', 'published', 'assumed', 'fitted', 'predicted'].map((value) => ({
  value,
  words: value,
}));

/** A quantity of the register: symbol, name, unit, how it comes by its value and how it is known. */
export function QuantityForm({ id, onClose }: { readonly id: string | null; readonly onClose: () => void }) {
  const evidence = useEvidence();
  const before = evidence.quantities.find((quantity) => quantity.id === id);
  const { create, replace, remove } = useDefinition('quantities');
  const [refusal, setRefusal] = useState<string | null>(null);
  const schema = useMemo(() => quantityDraftSchema(evidence, id), [evidence, id]);
  const form = useForm<QuantityDraft>({
    resolver: zodResolver(schema) as never,
    defaultValues: before ? draftOf(before, evidence) : emptyDraft(),
  });
  const { register, setValue, formState } = form;
  const { errors, isSubmitting } = formState;
  const origin = useWatch({ control: form.control, name: 'origin' });

  const attempt = async (work: () => Promise<unknown>, done: string) => {
    try {
      await work();
      say(done);
      onClose();
    } catch (error) {
      setRefusal(sentenceOf(error));
      const fields = error instanceof ApiError ? error.fields : {};
      for (const [path, message] of Object.entries(fields)) {
        const name = path.replace(/^row\./, '').split('.')[0] ?? '';
        if (name in emptyDraft()) form.setError(name as keyof QuantityDraft, { message });
      }
    }
  };
  const keep = form.handleSubmit((draft) => {
    const row = toQuantityBody(draft, evidence);
    return attempt(
      () => (id ? replace(id, row) : create(row)),
      `${row.symbol}, ${row.name}, is ${id ? 'changed' : 'in the register'}.`,
    );
  });
  return (
    <form
      noValidate
      aria-label={before ? `Change ${before.name}` : 'New quantity'}
      className="grid grid-cols-2 gap-x-3 gap-y-2.5 border-t border-hair py-3"
      onSubmit={(event) => void keep(event)}
    >
      <Field
        label="Symbol"
        placeholder="C_v or theta"
        error={errors.symbol?.message}
        {...register('symbol')}
      />
      <Field
        label="Unit"
        placeholder="cm, none if a number"
        error={errors.unit?.message}
        {...register('unit')}
      />
      <Field label="Name" frameClassName="col-span-2" error={errors.name?.message} {...register('name')} />
      <Select
        label="Its value is"
        frameClassName="col-span-2"
        options={ORIGIN_OPTIONS}
        {...register('origin', {
          onChange: (event: { target: { value: string } }) =>
            setValue('status', usualStatus(event.target.value as Origin)),
        })}
      />
      <OriginFields origin={origin} control={form.control} register={register} errors={errors} />
      <Select label="Known as" options={STATUS_OPTIONS} {...register('status')} />
      <Field
        label="How, or from where"
        placeholder="steel rule, once"
        error={errors.source?.message}
        {...register('source')}
      />
      {refusal && (
        <div className="col-span-2">
          <Notice title="Not kept.">{refusal}</Notice>
        </div>
      )}
      <div className="col-span-2 mt-1 flex flex-wrap items-center gap-2.5">
        <Button type="submit" kind="main" busy={isSubmitting}>
          {id ? 'Keep the change' : 'Add quantity'}
        </Button>
        <Button kind="plain" onClick={onClose}>
          Leave it
        </Button>
        {before && (
          <Button
            kind="risk"
            onClick={() => void attempt(() => remove(before.id), `${before.name} is removed.`)}
          >
            Remove
          </Button>
        )}
      </div>
    </form>
  );
}
