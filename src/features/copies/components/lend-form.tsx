import { useForm } from 'react-hook-form';
import type { Copy, CopyReader } from '#shared/contracts/copies.ts';
import { Button } from '#src/components/button.tsx';
import { Choice } from '#src/components/choice-group.tsx';
import { Field } from '#src/components/field.tsx';
import { Notice } from '#src/components/notice.tsx';
import { Select } from '#src/components/select.tsx';
import { ApiError, sentenceOf } from '#src/lib/api/api-error.ts';
import { showFieldErrors } from '#src/lib/forms/show-field-errors.ts';
import type { ProblemAddress } from '#src/lib/problem/problem-address.ts';
import { useTeam } from '#src/lib/team/team-context.ts';
import { useLendCopy } from '../api/change-copies.ts';
import { lendDefaults, toLocal } from '../sentences/lend-defaults.ts';

interface LendFormProps {
  readonly address: ProblemAddress;
  readonly editions: readonly number[];
  readonly onLent: (lent: { copy: Copy; token: string }) => void;
  readonly onClose: () => void;
}

interface LendValues {
  readonly edition: string;
  readonly recipient: string;
  readonly reader: CopyReader;
  readonly from: string;
  readonly until: string;
  readonly passphrase: string;
  readonly mayPrint: boolean;
}

const READERS = [
  { value: 'opponent', words: 'opponent' },
  { value: 'reviewer', words: 'reviewer' },
] as const;

/** What a captain says of a copy. */
export function LendForm({ address, editions, onLent, onClose }: LendFormProps) {
  const { team } = useTeam();
  const { mutate, isPending, error } = useLendCopy(address.team);
  const usual = lendDefaults(team.fights, address.number, new Date());
  const { register, handleSubmit, setError, formState } = useForm<LendValues>({
    defaultValues: {
      edition: String(editions[0] ?? ''),
      recipient: usual.recipient,
      reader: 'opponent',
      from: toLocal(new Date()),
      until: toLocal(usual.until),
      passphrase: '',
      mayPrint: false,
    },
  });
  const { errors } = formState;
  const isAboutField = error instanceof ApiError && Object.keys(error.fields).length > 0;
  const submit = handleSubmit(({ edition, from, until, passphrase, ...rest }) =>
    mutate(
      {
        number: address.number,
        n: Number(edition),
        wanted: {
          ...rest,
          from: new Date(from).toISOString(),
          until: new Date(until).toISOString(),
          passphrase: passphrase === '' ? null : passphrase,
        },
      },
      {
        onSuccess: onLent,
        onError: (failure) =>
          void showFieldErrors(failure, setError, ['recipient', 'from', 'until', 'passphrase']),
      },
    ),
  );
  const moment = { required: 'Say when.' };
  return (
    <form noValidate onSubmit={(event) => void submit(event)} className="grid gap-3.5">
      {editions.length > 1 && (
        <Select
          label="Edition"
          options={editions.map((n) => ({ value: String(n), words: `edition ${n}` }))}
          {...register('edition')}
        />
      )}
      <div className="grid grid-cols-[1fr_130px] gap-3">
        <Field
          label="To whom"
          maxLength={80}
          error={errors.recipient?.message}
          {...register('recipient', { required: 'Say to whom it is lent, like Gannet Bank.' })}
        />
        <Select label="As" options={READERS} {...register('reader')} />
      </div>
      <div className="grid gap-3 sm:grid-cols-2">
        <Field
          label="From"
          type="datetime-local"
          className="text-sm"
          error={errors.from?.message}
          {...register('from', moment)}
        />
        <Field
          label="Until"
          type="datetime-local"
          className="text-sm"
          hint={usual.fight === null ? undefined : `The evening of ${usual.fight}.`}
          error={errors.until?.message}
          {...register('until', moment)}
        />
      </div>
      <Field
        label="Passphrase, if you want one"
        autoComplete="off"
        hint="Give it to them by another way than the address."
        error={errors.passphrase?.message}
        {...register('passphrase')}
      />
      <Choice
        kind="checkbox"
        words="May be printed, with their name on every page"
        {...register('mayPrint')}
      />
      {error && !isAboutField && <Notice title={sentenceOf(error)} />}
      <div className="mt-1 flex flex-wrap items-center justify-end gap-2.5">
        <Button kind="plain" onClick={onClose}>
          Do not lend
        </Button>
        <Button type="submit" busy={isPending}>
          Lend the edition
        </Button>
      </div>
    </form>
  );
}
