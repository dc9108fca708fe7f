import { zodResolver } from '@hookform/resolvers/zod';
import { useState } from 'react';
import { useForm } from 'react-hook-form';
import type { KeptEvent } from '#shared/contracts/fights.ts';
import type { Event } from '#shared/talk/event.ts';
import { Button } from '#src/components/button.tsx';
import { Field } from '#src/components/field.tsx';
import { Notice } from '#src/components/notice.tsx';
import { Select } from '#src/components/select.tsx';
import { sentenceOf } from '#src/lib/api/api-error.ts';
import { useKeepEvent, useRemoveEvent } from '../api/events.ts';
import { BlockFields } from './block-fields.tsx';
import { eventForm, toEvent, toEventValues, type EventFormValues } from './event-form-values.ts';

interface EventFormProps {
  readonly team: string;
  /** null: it is a new one. */
  readonly kept: KeptEvent | null;
  readonly start: Event;
  readonly onDone: () => void;
}

const ROLE_LABELS = { report: 'the reporter', oppose: 'the opponent', review: 'the reviewer' } as const;

/** What differs from event to event: blocks, weights and rules. */
export function EventForm({ team, kept, start, onDone }: EventFormProps) {
  const form = useForm<EventFormValues>({
    resolver: zodResolver(eventForm),
    defaultValues: toEventValues(start),
  });
  const { register, handleSubmit, formState } = form;
  const { errors } = formState;
  const [wrong, setWrong] = useState<string | null>(null);
  const keep = useKeepEvent(team, kept);
  const remove = useRemoveEvent(team);
  const submit = handleSubmit((values) => {
    const read = toEvent(values);
    setWrong('sentence' in read ? read.sentence : null);
    if ('event' in read) keep.mutate(read.event, { onSuccess: onDone });
  });
  const failure =
    wrong ?? (keep.error ? sentenceOf(keep.error) : remove.error ? sentenceOf(remove.error) : null);
  return (
    <form noValidate onSubmit={(event) => void submit(event)} className="grid gap-5 py-4">
      <div className="grid gap-4 sm:grid-cols-[1fr_1.6fr]">
        <Field label="Event" error={errors.name?.message} {...register('name')} />
        <Field label="Note" error={errors.note?.message} {...register('note')} />
      </div>
      <fieldset>
        <legend className="mb-1.5 text-xs text-ink-2">Who is on stage</legend>
        <div className="flex flex-wrap gap-x-5 gap-y-2">
          {(['report', 'oppose', 'review'] as const).map((role) => (
            <label key={role} className="flex min-h-6 items-center gap-1.5 text-base">
              <input type="checkbox" value={role} {...register('roles')} />
              {ROLE_LABELS[role]}
            </label>
          ))}
        </div>
        {errors.roles && <p className="mt-1 text-sm text-leak">{errors.roles.message}</p>}
      </fieldset>
      <BlockFields form={form} />
      <div className="grid grid-cols-2 gap-4 sm:grid-cols-4">
        {(['report', 'oppose', 'review'] as const).map((role) => (
          <Field
            key={role}
            label={`Weight of ${ROLE_LABELS[role].replace('the ', '')}`}
            inputMode="decimal"
            error={errors.weights?.[role]?.message}
            {...register(`weights.${role}`)}
          />
        ))}
        <Field
          label="Times one person may be on stage"
          inputMode="numeric"
          error={errors.stagesPerPerson?.message}
          {...register('stagesPerPerson')}
        />
      </div>
      <div className="grid gap-2 text-base">
        <label className="flex min-h-6 items-center gap-2">
          <input type="checkbox" {...register('copiesEveningBefore')} />
          Copies go out the evening before
        </label>
        <label className="flex min-h-6 items-center gap-2">
          <input type="checkbox" {...register('opponentMayShowResults')} />
          The opponent may show results of their own
        </label>
        <label className="flex min-h-6 items-center gap-2">
          <input type="checkbox" {...register('notesPassed')} />
          Notes may be passed to who is on stage
        </label>
        <Select
          label="A copy closes"
          frameClassName="max-w-[320px]"
          options={[
            { value: 'stage ends', words: 'when the stage ends' },
            { value: 'fight day ends', words: 'when the day of the fight ends' },
          ]}
          {...register('copyCloses')}
        />
      </div>
      {failure !== null && <Notice title="The event was not kept.">{failure}</Notice>}
      <div className="flex flex-wrap justify-end gap-2.5">
        {kept && (
          <Button
            kind="risk"
            className="mr-auto"
            busy={remove.isPending}
            onClick={() => remove.mutate(kept, { onSuccess: onDone })}
          >
            Remove this event
          </Button>
        )}
        <Button kind="plain" onClick={onDone}>
          Leave it
        </Button>
        <Button kind="main" type="submit" busy={keep.isPending}>
          Keep the event
        </Button>
      </div>
    </form>
  );
}
