import type { ButtonHTMLAttributes, Ref } from 'react';
import { classNames } from '#src/lib/class-names.ts';

const KINDS = {
  main: 'border-ink bg-ink text-on-ink font-semibold',
  outline: 'border-edge bg-paper text-ink',
  plain: 'border-transparent bg-transparent text-ink-2 px-2',
  risk: 'border-leak bg-paper text-leak',
} as const;

const SIZES = {
  normal: 'min-h-9 px-3.5 text-sm rounded-md',
  tiny: 'min-h-7 px-2.5 text-xs rounded-md',
  tall: 'min-h-11 px-4.5 text-sm rounded-md',
  phone: 'min-h-16 px-5 text-report rounded-lg w-full',
} as const;

export interface ButtonProps extends ButtonHTMLAttributes<HTMLButtonElement> {
  /** One main button in a view; risk only to exclude, take back or remove. */
  readonly kind?: keyof typeof KINDS;
  readonly size?: keyof typeof SIZES;
  /** Something is on its way: the button cannot be pressed a second time, and keeps its focus. */
  readonly busy?: boolean;
  readonly ref?: Ref<HTMLButtonElement>;
}

export function Button({
  kind = 'outline',
  size = 'normal',
  busy = false,
  className,
  onClick,
  type = 'button',
  ...rest
}: ButtonProps) {
  return (
    <button
      {...rest}
      type={busy && type === 'submit' ? 'button' : type}
      aria-disabled={busy || undefined}
      onClick={busy ? undefined : onClick}
      className={classNames(
        'inline-flex items-center justify-center gap-2 border-[1.25px] font-ui font-[550] whitespace-nowrap transition-opacity duration-[120ms] disabled:opacity-50',
        busy && 'opacity-70',
        KINDS[kind],
        SIZES[size],
        className,
      )}
    />
  );
}
