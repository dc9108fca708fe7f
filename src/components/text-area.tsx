import { useId, type ReactNode, type Ref, type TextareaHTMLAttributes } from 'react';
import { classNames } from '#src/lib/class-names.ts';
import { controlClass, FieldFrame, fieldIds } from './field-frame.tsx';

export interface TextAreaProps extends TextareaHTMLAttributes<HTMLTextAreaElement> {
  readonly label: ReactNode;
  readonly hint?: ReactNode;
  readonly error?: string | undefined;
  readonly frameClassName?: string | undefined;
  readonly ref?: Ref<HTMLTextAreaElement>;
}

/** Several lines of text. */
export function TextArea({
  label,
  hint,
  error,
  frameClassName,
  className,
  id: givenId,
  rows = 4,
  ...area
}: TextAreaProps) {
  const ownId = useId();
  const id = givenId ?? ownId;
  const { describedBy } = fieldIds(id, hint, error);
  return (
    <FieldFrame id={id} label={label} hint={hint} error={error} className={frameClassName}>
      <textarea
        {...area}
        id={id}
        rows={rows}
        aria-invalid={error ? true : undefined}
        aria-describedby={describedBy}
        className={classNames(
          'block w-full rounded-md border-[1.25px] bg-paper px-3 py-2 outline-none placeholder:text-ink-3 disabled:opacity-60 focus:border-ink focus:shadow-[0_0_0_.75px_var(--color-ink)]',
          controlClass(error),
          className,
        )}
      />
    </FieldFrame>
  );
}
