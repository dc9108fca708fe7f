import type { ReactNode } from 'react';
import type { UseFormReturn } from 'react-hook-form';
import { Button } from '#src/components/button.tsx';
import { Notice } from '#src/components/notice.tsx';
import { ApiError, sentenceOf } from '#src/lib/api/api-error.ts';
import { showFieldErrors } from '#src/lib/forms/show-field-errors.ts';

export interface EntryValues {
  readonly name: string;
  readonly email: string;
  readonly passphrase: string;
}

interface EntryFormProps {
  readonly form: UseFormReturn<EntryValues>;
  /** Does what the form is for; rejects when it was refused. */
  readonly onSubmit: (values: EntryValues) => Promise<unknown>;
  readonly error: unknown;
  readonly busy: boolean;
  readonly action: string;
  readonly children: ReactNode;
}

const FIELDS = ['name', 'email', 'passphrase'] as const;

/** The fields, what went wrong, and the one button; the server's sentences stand beside the fields they are about. */
export function EntryForm({ form, onSubmit, error, busy, action, children }: EntryFormProps) {
  const submit = form.handleSubmit((values) =>
    onSubmit(values).catch((failure: unknown) => void showFieldErrors(failure, form.setError, FIELDS)),
  );
  const isAboutField = error instanceof ApiError && FIELDS.some((name) => error.fields[name] !== undefined);
  return (
    <form noValidate onSubmit={(event) => void submit(event)} className="grid gap-4">
      {children}
      {error !== null && !isAboutField && <Notice title={sentenceOf(error)} />}
      <Button kind="main" type="submit" busy={busy} className="min-h-12 text-[16px]">
        {action}
      </Button>
    </form>
  );
}
