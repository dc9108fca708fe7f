import { useId, type ReactNode, type Ref, type SelectHTMLAttributes } from 'react';
import { classNames } from '#src/lib/class-names.ts';
import { controlClass, FieldFrame, fieldIds } from './field-frame.tsx';

export interface SelectProps extends Omit<SelectHTMLAttributes<HTMLSelectElement>, 'size'> {
  readonly label: ReactNode;
  readonly options: readonly { readonly value: string; readonly words: string }[];
  readonly hint?: ReactNode;
  readonly error?: string | undefined;
  readonly frameClassName?: string | undefined;
  readonly ref?: Ref<HTMLSelectElement>;
}

/** One of several, in the browser's own list. */
export function Select({
  label,
  options,
  hint,
  error,
  frameClassName,
  className,
  id: givenId,
  ...select
}: SelectProps) {
  const ownId = useId();
  const id = givenId ?? ownId;
  const { describedBy } = fieldIds(id, hint, error);
  return (
    <FieldFrame id={id} label={label} hint={hint} error={error} className={frameClassName}>
      <select
        {...select}
        id={id}
        aria-invalid={error ? true : undefined}
        aria-describedby={describedBy}
        className={classNames(
          'h-10 w-full rounded-md border-[1.25px] bg-paper px-2.5 outline-none disabled:opacity-60 focus:border-ink focus:shadow-[0_0_0_.75px_var(--color-ink)]',
          controlClass(error),
          className,
        )}
      >
        {options.map(({ value, words }) => (
          <option key={value} value={value}>
            {words}
          </option>
        ))}
      </select>
    </FieldFrame>
  );
}
