import type { ReactNode } from 'react';
import { Triangle } from './triangle.tsx';

/** Ids that tie a control to its label, hint and error. */
export function fieldIds(id: string, hint: ReactNode, error: string | undefined) {
  const hintId = hint ? `${id}-hint` : undefined;
  const errorId = error ? `${id}-error` : undefined;
  const describedBy = [errorId, hintId].filter(Boolean).join(' ');
  return { hintId, errorId, describedBy: describedBy === '' ? undefined : describedBy };
}

interface FieldFrameProps {
  readonly id: string;
  readonly label: ReactNode;
  readonly hint?: ReactNode;
  readonly error?: string | undefined;
  readonly className?: string | undefined;
  readonly children: ReactNode;
}

/** Label above, control, then what is wrong or what helps. */
export function FieldFrame({ id, label, hint, error, className, children }: FieldFrameProps) {
  const { hintId, errorId } = fieldIds(id, hint, error);
  return (
    <div className={className ?? 'min-w-0'}>
      <label htmlFor={id} className="mb-[5px] block text-xs font-[550] text-ink-2">
        {label}
      </label>
      {children}
      {error && (
        <p id={errorId} role="alert" className="mt-[5px] flex items-start gap-1.5 text-xs text-leak">
          <Triangle className="mt-px flex-none" />
          <span>{error}</span>
        </p>
      )}
      {hint && (
        <div id={hintId} className="mt-[5px] text-xs text-ink-3">
          {hint}
        </div>
      )}
    </div>
  );
}

/** Outline of a control: edge, ink ring while it has the focus, leak ring when it is wrong. */
export function controlClass(error: string | undefined): string {
  return error
    ? 'border-leak shadow-[0_0_0_1px_var(--color-leak)] focus-within:shadow-[0_0_0_1.5px_var(--color-leak)]'
    : 'border-edge focus-within:border-ink focus-within:shadow-[0_0_0_.75px_var(--color-ink)]';
}
