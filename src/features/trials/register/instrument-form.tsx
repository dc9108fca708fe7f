import { zodResolver } from '@hookform/resolvers/zod';
import { useState } from 'react';
import { useFieldArray, useForm } from 'react-hook-form';
import { z } from 'zod';
import { uncertaintyPartSchema } from '#shared/evidence/evidence.ts';
import { readSi } from '#shared/units/reading.ts';
import { Button } from '#src/components/button.tsx';
import { Field } from '#src/components/field.tsx';
import { Notice } from '#src/components/notice.tsx';
import { Word } from '#src/components/word.tsx';
import { sentenceOf } from '#src/lib/api/api-error.ts';
import { useDefinition } from '#src/lib/evidence/use-definition.ts';
import { useEvidence } from '#src/lib/evidence/use-evidence.ts';
import { say } from '#src/lib/sill-store.ts';
import { NEW_PART, PartFields, type PartsForm } from './part-fields.tsx';

interface InstrumentDraft extends PartsForm {
  name: string;
  note: string;
}

const schema = z
  .object({
    name: z.string().trim().min(1, 'Name the instrument, like "steel rule".').max(80),
    note: z.string().trim().max(400),
    parts: z.array(uncertaintyPartSchema).max(20),
  })
  .superRefine(({ parts }, context) => {
    parts.forEach((part, index) => {
      const read = readSi({ text: part.amount, unit: part.kind === 'scale' ? '1' : part.unit });
      const message = !read.ok
        ? read.sentence
        : read.value <= 0
          ? 'An uncertainty is above 0, as 0.05.'
          : null;
      if (message) context.addIssue({ code: 'custom', path: ['parts', index, 'amount'], message });
    });
  });

export function InstrumentForm({
  id,
  onClose,
}: {
  readonly id: string | null;
  readonly onClose: () => void;
}) {
  const { instruments } = useEvidence();
  const before = instruments.find((instrument) => instrument.id === id);
  const { create, replace, remove } = useDefinition('instruments');
  const [refusal, setRefusal] = useState<string | null>(null);
  const form = useForm<InstrumentDraft>({
    resolver: zodResolver(schema) as never,
    defaultValues: { name: before?.name ?? '', note: before?.note ?? '', parts: before?.parts ?? [] },
  });
  const { errors, isSubmitting } = form.formState;
  const parts = useFieldArray({ control: form.control, name: 'parts' });
  const attempt = async (work: () => Promise<unknown>, done: string) => {
    try {
      await work();
      say(done);
      onClose();
    } catch (error) {
      setRefusal(sentenceOf(error));
    }
  };
  const keep = form.handleSubmit((draft) => {
    const row = { name: draft.name, note: draft.note || undefined, parts: draft.parts };
    return attempt(
      () => (id ? replace(id, row) : create(row)),
      `${draft.name} is ${id ? 'changed' : 'in the register'}.`,
    );
  });
  return (
    <form noValidate className="border-t border-hair py-3" onSubmit={(event) => void keep(event)}>
      <Field label="Instrument" error={errors.name?.message} {...form.register('name')} />
      <Field label="Note" frameClassName="mt-2.5" {...form.register('note')} />
      {parts.fields.map((field, index) => (
        <PartFields
          key={field.id}
          index={index}
          register={form.register as never}
          errors={errors}
          onRemove={() => parts.remove(index)}
        />
      ))}
      <p className="mt-3 text-sm">
        <Word onClick={() => parts.append(NEW_PART)}>Add a part of its uncertainty</Word>
      </p>
      {refusal && (
        <Notice title="Not kept." className="mt-3">
          {refusal}
        </Notice>
      )}
      <div className="mt-3 flex flex-wrap items-center gap-2.5">
        <Button type="submit" kind="main" busy={isSubmitting}>
          {id ? 'Keep the change' : 'Add instrument'}
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
