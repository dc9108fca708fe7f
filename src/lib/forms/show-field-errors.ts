import type { FieldPath, FieldValues, UseFormSetError } from 'react-hook-form';
import { ApiError } from '#src/lib/api/api-error.ts';

/** Puts the server's sentences beside the fields they are about; false when none of them belongs to this form. */
export function showFieldErrors<Values extends FieldValues>(
  error: unknown,
  setError: UseFormSetError<Values>,
  known: readonly FieldPath<Values>[],
): boolean {
  if (!(error instanceof ApiError)) return false;
  const { fields } = error;
  const shown = known.filter((name) => fields[name] !== undefined);
  shown.forEach((name, index) => {
    setError(name, { type: 'server', message: fields[name] ?? '' }, { shouldFocus: index === 0 });
  });
  return shown.length > 0;
}
