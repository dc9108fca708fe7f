import { useState } from 'react';
import { Button } from '#src/components/button.tsx';
import { Field } from '#src/components/field.tsx';
import { Mark } from '#src/components/mark.tsx';
import { Notice } from '#src/components/notice.tsx';
import { ApiError, sentenceOf } from '#src/lib/api/api-error.ts';
import { useTitle } from '#src/lib/use-title.ts';
import { usePassCopy } from '../api/pass-copy.ts';

/** Asks for the passphrase that was given with the address of a copy. */
export function PassphrasePage({ token }: { readonly token: string }) {
  const [passphrase, setPassphrase] = useState('');
  const { mutate, isPending, error } = usePassCopy(token);
  const besideField = error instanceof ApiError ? error.fields.passphrase : undefined;
  useTitle('A lent copy');
  return (
    <main
      id="page"
      tabIndex={-1}
      data-region="page"
      className="copy-hatched grid min-h-dvh place-items-center px-4 py-10"
    >
      <form
        noValidate
        className="page-sheet grid w-full max-w-[440px] gap-4 px-8 py-8 max-sm:px-5"
        onSubmit={(event) => {
          event.preventDefault();
          mutate(passphrase);
        }}
      >
        <Mark size={34} />
        <div>
          <h1 className="font-report text-xl font-medium">A copy was lent to you</h1>
          <p className="mt-1.5 text-ink-2">It opens with the passphrase that was given with its address.</p>
        </div>
        <Field
          label="Passphrase"
          type="password"
          autoComplete="off"
          required
          value={passphrase}
          error={besideField}
          onChange={(event) => setPassphrase(event.target.value)}
        />
        {error && besideField === undefined && <Notice title={sentenceOf(error)} />}
        <div>
          <Button kind="main" type="submit" busy={isPending}>
            Open the copy
          </Button>
        </div>
      </form>
    </main>
  );
}
