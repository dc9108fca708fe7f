import type { ReactNode } from 'react';
import type { BorrowedCopy, Copy } from '#shared/contracts/copies.ts';
import { Seal } from '#src/components/seal.tsx';
import { dayAndShortMonth } from '#src/lib/dates/say-date.ts';
import { closesWords, isOut } from '../sentences/copy-words.ts';
import { DayChannel, type DayScale } from './day-scale.tsx';

/** Seal, edition, the other team, its days, when it closes; below 900 px one under the other. */
export const COPY_GRID =
  'grid grid-cols-[64px_minmax(0,1.1fr)_minmax(0,1.25fr)_336px_minmax(150px,.8fr)] items-center gap-x-7 max-lg:grid-cols-[64px_minmax(0,1fr)_minmax(0,1fr)_minmax(140px,.8fr)] max-md:grid-cols-[64px_minmax(0,1fr)] max-md:gap-x-4';

interface CopyRowProps {
  readonly copy: Copy | BorrowedCopy;
  readonly scale: DayScale;
  /** The other team, and what it does with the copy. */
  readonly who: string;
  readonly words: ReactNode;
  /** What can be done with it. */
  readonly children?: ReactNode;
}

/** One copy, ours or theirs. */
export function CopyRow({ copy, scale, who, words, children }: CopyRowProps) {
  const { edition, problem } = copy;
  const isOver = !isOut(copy);
  return (
    <li className={`${COPY_GRID} border-b border-hair py-3 ${isOver ? 'text-ink-3' : ''}`}>
      <Seal n={edition.n} seal={edition.seal} size={64} className="max-md:row-span-4 max-md:self-start" />
      <div className="min-w-0">
        <b className="font-report text-[19px]/6 font-medium">{problem.title}</b>
        <p className="text-sm text-ink-2">
          edition {edition.n}, {dayAndShortMonth(new Date(edition.at))}
        </p>
      </div>
      <div className="min-w-0 text-sm max-md:mt-1.5">
        <p className={isOver ? '' : 'font-[650]'}>{who}</p>
        <p className="text-ink-2">{words}</p>
      </div>
      <div className="max-lg:hidden">
        <DayChannel scale={scale} copy={copy} />
      </div>
      <div className="text-sm md:text-right max-md:mt-1.5">
        <p className="text-ink-2">
          {copy.standing === 'open' && <span className="md:sr-only">open until </span>}
          {closesWords(copy)}
        </p>
        {children && <div className="mt-1 flex flex-wrap gap-x-4 gap-y-1 md:justify-end">{children}</div>}
      </div>
    </li>
  );
}

/** The head above rows. */
export function CopyHead({
  title,
  id,
  other,
  children,
}: {
  readonly title: string;
  readonly id: string;
  /** Of the column of the other team. */
  readonly other: string;
  /** The scale's own head. */
  readonly children: ReactNode;
}) {
  return (
    <div className={`${COPY_GRID} items-end border-b-[1.25px] border-ink pb-1`}>
      <h2 id={id} className="col-span-2 font-report text-[21px]/7 font-medium">
        {title}
      </h2>
      <span className="text-sm text-ink-2 max-md:hidden">{other}</span>
      <span className="max-lg:hidden">{children}</span>
      <span className="text-right text-sm text-ink-2 max-md:hidden">Closes</span>
    </div>
  );
}
