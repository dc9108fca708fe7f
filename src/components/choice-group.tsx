import type { InputHTMLAttributes, ReactNode, Ref } from 'react';

interface ChoiceProps extends InputHTMLAttributes<HTMLInputElement> {
  readonly kind: 'radio' | 'checkbox';
  readonly words: ReactNode;
  readonly ref?: Ref<HTMLInputElement>;
}

/** One word that can be chosen; spread `register('name')` onto it. */
export function Choice({ kind, words, ...input }: ChoiceProps) {
  return (
    <label className="inline-flex min-h-9 cursor-pointer items-center gap-2 has-disabled:cursor-default has-disabled:opacity-60">
      <input {...input} type={kind} className="size-[17px] accent-ink" />
      <span>{words}</span>
    </label>
  );
}

interface ChoiceGroupProps {
  readonly legend: ReactNode;
  readonly hint?: ReactNode;
  readonly children: ReactNode;
}

/** Choices that belong together, under one question. */
export function ChoiceGroup({ legend, hint, children }: ChoiceGroupProps) {
  return (
    <fieldset className="min-w-0">
      <legend className="text-xs font-[550] text-ink-2">{legend}</legend>
      <div className="flex flex-wrap gap-x-6">{children}</div>
      {hint && <p className="text-xs text-ink-3">{hint}</p>}
    </fieldset>
  );
}
