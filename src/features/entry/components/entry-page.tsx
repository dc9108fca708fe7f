import type { ReactNode } from 'react';
import { Link } from 'react-router-dom';
import { Mark } from '#src/components/mark.tsx';
import { useTitle } from '#src/lib/use-title.ts';

interface EntryPageProps {
  readonly title: string;
  readonly sentence?: ReactNode;
  readonly children?: ReactNode;
}

/** A page for who is on the way in: one question, one form. */
export function EntryPage({ title, sentence, children }: EntryPageProps) {
  useTitle(title);
  return (
    <main id="page" tabIndex={-1} data-region="page" className="min-h-dvh px-5 pt-6 pb-16 sm:px-14 lg:pt-10">
      <Link
        to="/"
        className="inline-flex items-center gap-3 font-report text-[24px]/[30px] font-semibold text-ink no-underline"
      >
        <Mark size={38} />
        Holdwater
      </Link>
      <div className="mx-auto mt-14 max-w-[460px] lg:mt-24">
        <h1 className="font-report text-[34px]/[40px] font-medium tracking-[-.01em] text-balance">{title}</h1>
        {sentence && <div className="mt-3 font-report text-report text-ink-2">{sentence}</div>}
        <div className="mt-7">{children}</div>
      </div>
    </main>
  );
}
