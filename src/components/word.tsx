import type { ButtonHTMLAttributes, ReactNode, Ref } from 'react';
import { Link, type LinkProps } from 'react-router-dom';
import { classNames } from '#src/lib/class-names.ts';

interface WordProps extends ButtonHTMLAttributes<HTMLButtonElement> {
  readonly ref?: Ref<HTMLButtonElement>;
}

/** An action said in a word, at the end of the sentence it belongs to. */
export function Word({ className, ...rest }: WordProps) {
  return <button type="button" {...rest} className={classNames('word', className)} />;
}

/** A word that leads on. */
export function WordLink({ className, ...rest }: LinkProps & { readonly children: ReactNode }) {
  return <Link {...rest} className={classNames('word', className)} />;
}
