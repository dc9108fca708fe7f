import { useState } from 'react';
import { Button } from '#src/components/button.tsx';
import { Field } from '#src/components/field.tsx';
import { Notice } from '#src/components/notice.tsx';
import { ApiError, sentenceOf } from '#src/lib/api/api-error.ts';
import { useEnterRoom } from '../api/room.ts';

interface KeyFormProps {
  readonly token: string;
  /** On the button. */
  readonly words: string;
}

/** The key of a room of questions: set by who is first, shown by who comes later. */
export function KeyForm({ token, words }: KeyFormProps) {
  const [key, setKey] = useState('');
  const { mutate, isPending, error } = useEnterRoom(token);
  const besideField = error instanceof ApiError ? error.fields.key : undefined;
  return (
    <form
      noValidate
      className="flex flex-wrap items-start gap-3"
      onSubmit={(event) => {
        event.preventDefault();
        mutate(key);
      }}
    >
      <Field
        label="Key"
        type="password"
        autoComplete="off"
        required
        frameClassName="w-[280px] max-w-full"
        value={key}
        error={besideField}
        onChange={(event) => setKey(event.target.value)}
      />
      <Button kind="main" type="submit" busy={isPending} className="mt-[22px] h-10">
        {words}
      </Button>
      {error && besideField === undefined && (
        <Notice
          title={
            error instanceof ApiError && error.status === 404
              ? 'Nothing opens with this key at this address.'
              : sentenceOf(error)
          }
          className="basis-full"
        />
      )}
    </form>
  );
}
