import { useId, type InputHTMLAttributes, type ReactNode, type Ref } from 'react';
import { classNames } from '#src/lib/class-names.ts';
import { controlClass, FieldFrame, fieldIds } from './field-frame.tsx';

const HEIGHTS = {
  normal: 'h-10',
  tall: 'h-11',
  large: 'h-[46px] text-[16px]',
  phone: 'h-12 text-lg',
} as const;

export interface FieldProps extends Omit<InputHTMLAttributes<HTMLInputElement>, 'size'> {
  readonly label: ReactNode;
  readonly hint?: ReactNode;
  /** A sentence that says what is wrong and proposes a value. */
  readonly error?: string | undefined;
  /** Unit, at the right in the report's face. */
  readonly unit?: ReactNode;
  /** Before the text, as ± before an uncertainty. */
  readonly before?: ReactNode;
  /** After the text, as a word that acts. */
  readonly after?: ReactNode;
  readonly size?: keyof typeof HEIGHTS;
  readonly frameClassName?: string | undefined;
  readonly ref?: Ref<HTMLInputElement>;
}

/** A line of text; spread `register('name')` of react-hook-form onto it. */
export function Field({
  label,
  hint,
  error,
  unit,
  before,
  after,
  size = 'normal',
  frameClassName,
  className,
  id: givenId,
  ...input
}: FieldProps) {
  const ownId = useId();
  const id = givenId ?? ownId;
  const { describedBy } = fieldIds(id, hint, error);
  return (
    <FieldFrame id={id} label={label} hint={hint} error={error} className={frameClassName}>
      <span
        className={classNames(
          'flex items-center gap-2 rounded-md border-[1.25px] bg-paper px-3',
          controlClass(error),
          HEIGHTS[size],
        )}
      >
        {before !== undefined && <span className="text-ink-3">{before}</span>}
        <input
          {...input}
          id={id}
          aria-invalid={error ? true : undefined}
          aria-describedby={describedBy}
          className={classNames(
            'h-full min-w-0 flex-1 bg-transparent outline-none placeholder:text-ink-3 disabled:opacity-60',
            className,
          )}
        />
        {unit !== undefined && <span className="font-report text-[16px] text-ink-3">{unit}</span>}
        {after}
      </span>
    </FieldFrame>
  );
}
