import type { ReactNode } from 'react';
import { useTitle } from '#src/lib/use-title.ts';

interface PlainPageProps {
  readonly title: string;
  readonly children: ReactNode;
}

/** One sentence and a way on, where there is nothing else to show. */
export function PlainPage({ title, children }: PlainPageProps) {
  useTitle(title);
  return (
    <main id="page" tabIndex={-1} data-region="page" className="page-top mx-auto max-w-[680px] px-5 pb-16">
      <h1 className="h1 mt-10">{title}</h1>
      <div className="mt-4 space-y-4 font-report text-report text-ink-2">{children}</div>
    </main>
  );
}
