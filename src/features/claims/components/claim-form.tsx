import { zodResolver } from '@hookform/resolvers/zod';
import { useState } from 'react';
import { Controller, useForm, useWatch } from 'react-hook-form';
import { Button } from '#src/components/button.tsx';
import { Choice, ChoiceGroup } from '#src/components/choice-group.tsx';
import { Field } from '#src/components/field.tsx';
import { Notice } from '#src/components/notice.tsx';
import { Select } from '#src/components/select.tsx';
import { TextArea } from '#src/components/text-area.tsx';
import { sentenceOf } from '#src/lib/api/api-error.ts';
import { useDefinition } from '#src/lib/evidence/use-definition.ts';
import { useEvidence } from '#src/lib/evidence/use-evidence.ts';
import { say } from '#src/lib/sill-store.ts';
import { claimDraft, claimDraftSchema, TESTS, toClaimBody, type ClaimDraft } from '../view/claim-draft.ts';
import { ReferencePicker } from './reference-picker.tsx';

const TEST_OPTIONS = Object.entries(TESTS).map(([value, words]) => ({ value, words }));

/** A sentence that the team would defend, and the test that decides it. The verdict is computed, never set. */
export function ClaimForm({ id, onClose }: { readonly id: string | null; readonly onClose: () => void }) {
  const evidence = useEvidence();
  const before = evidence.claims.find((claim) => claim.id === id) ?? null;
  const { create, replace, remove } = useDefinition('claims');
  const [refusal, setRefusal] = useState<string | null>(null);
  const { register, control, handleSubmit, formState } = useForm<ClaimDraft>({
    resolver: zodResolver(claimDraftSchema) as never,
    defaultValues: claimDraft(before),
  });
  const { errors, isSubmitting } = formState;
  const test = useWatch({ control, name: 'test' });
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
    const row = toClaimBody(draft, before, evidence);
    return attempt(
      () => (id ? replace(id, row) : create(row)),
      id ? `Claim ${before?.n ?? ''} is changed.` : 'The claim stands on the sheet.',
    );
  });
  const picker = (name: 'measured' | 'expected', label: string) => (
    <Controller
      control={control}
      name={name}
      render={({ field }) => (
        <ReferencePicker
          label={label}
          value={field.value}
          error={errors[name]?.message as string | undefined}
          onChange={field.onChange}
        />
      )}
    />
  );
  return (
    <form
      noValidate
      aria-label={before ? `Change claim ${before.n}` : 'New claim'}
      className="grid gap-3.5 border-t border-hair py-4"
      onSubmit={(event) => void keep(event)}
    >
      <TextArea label="We claim that" rows={2} error={errors.text?.message} {...register('text')} />
      <Select label="Decided by" options={TEST_OPTIONS} {...register('test')} />
      {test === 'none' && (
        <Field label="Open because" placeholder="one head measured so far" {...register('openBecause')} />
      )}
      {(test === 'equals' || test === 'bound') &&
        picker('measured', test === 'equals' ? 'This value' : 'The value')}
      {test === 'equals' && picker('expected', 'equals')}
      {test === 'model fits' && (
        <Select
          label="Comparison"
          options={[
            { value: '', words: 'choose' },
            ...evidence.comparisons.map((comparison) => ({ value: comparison.id, words: comparison.name })),
          ]}
          error={errors.comparison?.message}
          {...register('comparison')}
        />
      )}
      {test === 'bound' && (
        <>
          <ChoiceGroup legend="It is">
            <Choice kind="radio" value="at most" words="at most" {...register('side')} />
            <Choice kind="radio" value="at least" words="at least" {...register('side')} />
          </ChoiceGroup>
          <Field label="Limit" placeholder="50 cm" error={errors.limit?.message} {...register('limit')} />
        </>
      )}
      {refusal && <Notice title="Not kept.">{refusal}</Notice>}
      <div className="flex flex-wrap gap-2.5">
        <Button type="submit" kind="main" busy={isSubmitting}>
          {id ? 'Keep the change' : 'Add claim'}
        </Button>
        <Button kind="plain" onClick={onClose}>
          Leave it
        </Button>
        {before && (
          <Button
            kind="risk"
            onClick={() => void attempt(() => remove(before.id), `Claim ${before.n} is removed.`)}
          >
            Remove
          </Button>
        )}
      </div>
    </form>
  );
}
