import { zodResolver } from '@hookform/resolvers/zod';
import { useMemo, useState } from 'react';
import { useFieldArray, useForm } from 'react-hook-form';
import { Button } from '#src/components/button.tsx';
import { Field } from '#src/components/field.tsx';
import { Notice } from '#src/components/notice.tsx';
import { Select } from '#src/components/select.tsx';
import { Word } from '#src/components/word.tsx';
import { sentenceOf } from '#src/lib/api/api-error.ts';
import { useDefinition } from '#src/lib/evidence/use-definition.ts';
import { useEvidence } from '#src/lib/evidence/use-evidence.ts';
import { say } from '#src/lib/sill-store.ts';
import { modelDraft, modelDraftSchema, toModelBody, type ModelDraft } from '../view/model-draft.ts';
import { EquationField } from './equation-field.tsx';
import { LimitFields } from './limit-fields.tsx';

interface ModelFormProps {
  /** What it begins from; null: an empty sheet. */
  readonly from: string | null;
  /** A new model that leaves the one it begins from as it is, or a change of that one. */
  readonly isNew: boolean;
  readonly onClose: (kept: string | null) => void;
}

/** A model as it is written: equations, where it is trusted, what it assumes and leaves out. */
export function ModelForm({ from, isNew, onClose }: ModelFormProps) {
  const evidence = useEvidence();
  const before = evidence.models.find(({ id }) => id === from) ?? null;
  const { create, replace } = useDefinition('models');
  const [refusal, setRefusal] = useState<string | null>(null);
  const schema = useMemo(() => modelDraftSchema(evidence), [evidence]);
  const { register, control, handleSubmit, formState } = useForm<ModelDraft>({
    resolver: zodResolver(schema) as never,
    defaultValues: modelDraft(before, evidence),
  });
  const { errors, isSubmitting } = formState;
  const equations = useFieldArray({ control, name: 'equations' });
  const limits = useFieldArray({ control, name: 'limits' });
  const assumptions = useFieldArray({ control, name: 'assumptions' });
  const quantities = [
    { value: '', words: 'choose' },
    ...evidence.quantities.map(({ id, symbol, name }) => ({ value: id, words: `${symbol}, ${name}` })),
  ];
  const keep = handleSubmit(async (draft) => {
    try {
      const row = toModelBody(draft, evidence);
      const answer = before && !isNew ? await replace(before.id, row) : await create(row);
      say(
        before && isNew
          ? `The new model stands beside model ${before.n}, which stays.`
          : 'The model is kept.',
      );
      onClose(answer.id);
    } catch (error) {
      setRefusal(sentenceOf(error));
    }
  });
  return (
    <form
      noValidate
      aria-label="Model"
      className="page-sheet px-7 py-6.5 max-sm:px-4"
      onSubmit={(event) => void keep(event)}
    >
      <h1 className="font-report text-[24px]/[30px] font-medium">
        {isNew ? 'A new model' : `Model ${before?.n ?? ''}`}
      </h1>
      <Field label="Name" placeholder="thin jet, no drag" frameClassName="mt-3" {...register('name')} />
      <h2 className="h3 mt-5">Equations</h2>
      {equations.fields.map((field, index) => (
        <EquationField
          key={field.id}
          index={index}
          control={control}
          register={register}
          errors={errors}
          quantities={quantities}
          onRemove={equations.fields.length > 1 ? () => equations.remove(index) : null}
        />
      ))}
      <p className="mt-2 text-sm">
        <Word onClick={() => equations.append({ defines: '', expr: '' })}>Another equation</Word>
      </p>
      <Select
        label="Set against the trials"
        frameClassName="mt-4"
        options={quantities}
        error={errors.output?.message}
        {...register('output')}
      />
      <h2 className="h3 mt-5">Trusted where</h2>
      {limits.fields.map((field, index) => (
        <LimitFields
          key={field.id}
          index={index}
          register={register}
          errors={errors}
          quantities={quantities}
          onRemove={() => limits.remove(index)}
        />
      ))}
      <p className="mt-2 text-sm">
        <Word onClick={() => limits.append({ quantity: '', min: '', max: '', reason: '' })}>Add a range</Word>
      </p>
      <h2 className="h3 mt-5">Assumed and left out</h2>
      {assumptions.fields.map((field, index) => (
        <div key={field.id} className="mt-2.5 grid grid-cols-[1fr_130px] gap-3">
          <Field
            label="Assumed"
            placeholder="the jet stays whole"
            error={errors.assumptions?.[index]?.text?.message}
            {...register(`assumptions.${index}.text`)}
          />
          <Field label="Leaves out" placeholder="drag" {...register(`assumptions.${index}.neglects`)} />
          <p className="col-span-2 text-xs">
            <Word onClick={() => assumptions.remove(index)}>Remove</Word>
          </p>
        </div>
      ))}
      <p className="mt-2 text-sm">
        <Word onClick={() => assumptions.append({ text: '', neglects: '' })}>Add an assumption</Word>
      </p>
      {refusal && (
        <Notice title="Not kept." className="mt-4">
          {refusal}
        </Notice>
      )}
      <div className="mt-5 flex gap-2.5">
        <Button type="submit" kind="main" busy={isSubmitting}>
          {isNew ? 'Keep the new model' : 'Keep the change'}
        </Button>
        <Button kind="plain" onClick={() => onClose(null)}>
          Leave it
        </Button>
      </div>
    </form>
  );
}
