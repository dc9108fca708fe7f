import { zodResolver } from '@hookform/resolvers/zod';
import { useState } from 'react';
import { useForm } from 'react-hook-form';
import type { KeptEvent, KeptFight } from '#shared/contracts/fights.ts';
import type { ProblemSummary, Team } from '#shared/contracts/teams.ts';
import { Button } from '#src/components/button.tsx';
import { Dialog } from '#src/components/dialog.tsx';
import { Field } from '#src/components/field.tsx';
import { Notice } from '#src/components/notice.tsx';
import { Select } from '#src/components/select.tsx';
import { sentenceOf } from '#src/lib/api/api-error.ts';
import { showFieldErrors } from '#src/lib/forms/show-field-errors.ts';
import { useKeepFight, useRemoveFight } from '../api/fights.ts';
import { fightForm, toFightInput, toFormValues, type FightFormValues } from './fight-form-values.ts';
import { StageFields } from './stage-fields.tsx';

interface FightFormProps {
  readonly team: Team;
  readonly fight: KeptFight | null;
  readonly events: readonly KeptEvent[];
  readonly problems: readonly ProblemSummary[];
  readonly onDone: () => void;
}

/** A fight's day and place, the event it is held by, and who takes the stage when. */
export function FightForm({ team, fight, events, problems, onDone }: FightFormProps) {
  const form = useForm<FightFormValues>({
    resolver: zodResolver(fightForm),
    defaultValues: toFormValues(fight),
  });
  const { register, handleSubmit, setError, formState } = form;
  const { errors } = formState;
  const keep = useKeepFight(team.slug, fight);
  const submit = handleSubmit((values) =>
    keep.mutate(toFightInput(values), {
      onSuccess: onDone,
      onError: (error) => showFieldErrors(error, setError, fieldsOf(values)),
    }),
  );
  return (
    <form noValidate onSubmit={(event) => void submit(event)} className="grid gap-5 py-4">
      <div className="grid gap-4 sm:grid-cols-[1fr_1fr_1.4fr]">
        <Field label="Fight" placeholder="Fight 2" error={errors.name?.message} {...register('name')} />
        <Field label="Day and time" type="datetime-local" error={errors.at?.message} {...register('at')} />
        <Field label="Place" error={errors.place?.message} {...register('place')} />
      </div>
      <div className="grid gap-4 sm:grid-cols-2">
        <Select
          label="Held by the rules of"
          options={[
            { value: '', words: 'no event yet' },
            ...events.map(({ id, name }) => ({ value: id, words: name })),
          ]}
          error={errors.event?.message}
          {...register('event')}
        />
        <Field
          label="Result, once it is over"
          placeholder="2nd of 3"
          error={errors.result?.message}
          {...register('result')}
        />
      </div>
      <StageFields form={form} problems={problems} people={team.people} />
      {keep.error && <Notice title="The fight was not kept.">{sentenceOf(keep.error)}</Notice>}
      <div className="flex flex-wrap items-center justify-end gap-2.5">
        {fight && <RemoveFight team={team.slug} fight={fight} />}
        <Button kind="plain" onClick={onDone}>
          Leave it
        </Button>
        <Button kind="main" type="submit" busy={keep.isPending}>
          Keep the fight
        </Button>
      </div>
    </form>
  );
}

function fieldsOf({ stages }: FightFormValues) {
  return [
    'name',
    'at',
    'place',
    'result',
    'event',
    ...stages.flatMap(
      (_, i) =>
        [`stages.${i}.role`, `stages.${i}.problem`, `stages.${i}.against`, `stages.${i}.person`] as const,
    ),
  ] as const;
}

function RemoveFight({ team, fight }: { readonly team: string; readonly fight: KeptFight }) {
  const [isAsking, setAsking] = useState(false);
  const remove = useRemoveFight(team);
  return (
    <>
      <Button kind="risk" className="mr-auto" onClick={() => setAsking(true)}>
        Remove this fight
      </Button>
      <Dialog
        open={isAsking}
        onClose={() => setAsking(false)}
        title={`Remove ${fight.name}?`}
        sentence="Its date, its stages and its result go from the season. Problems, reports and copies stay."
        actions={
          <>
            <Button kind="plain" onClick={() => setAsking(false)}>
              Keep it
            </Button>
            <Button kind="risk" busy={remove.isPending} onClick={() => remove.mutate(fight)}>
              Remove it
            </Button>
          </>
        }
      >
        {remove.error && <Notice title="The fight was not removed.">{sentenceOf(remove.error)}</Notice>}
      </Dialog>
    </>
  );
}
