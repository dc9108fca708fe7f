import type { ReactNode } from 'react';
import type { Edition } from '#shared/contracts/editions.ts';
import { Seal } from '#src/components/seal.tsx';
import { WordLink } from '#src/components/word.tsx';
import { paths } from '#src/lib/paths.ts';
import type { ProblemAddress } from '#src/lib/problem/problem-address.ts';
import { figureWords, frozenWords } from '../sentences/say-when.ts';
import { PdfLink } from './pdf-link.tsx';

/** Three columns where there is room: what it is, what is said of it, what can be done. */
export const EDITION_GRID =
  'grid grid-cols-[316px_minmax(0,1fr)_250px] gap-x-[34px] gap-y-5 px-[30px] pt-[22px] pb-6 max-[1099.98px]:grid-cols-[316px_minmax(0,1fr)] max-md:grid-cols-1 max-sm:px-4.5';

interface EditionRowProps {
  readonly address: ProblemAddress;
  readonly edition: Edition;
  /** Who holds a copy of it. */
  readonly holders?: ReactNode;
  /** What else can be done with it, before printing. */
  readonly actions?: ReactNode;
}

/** A frozen edition: hatched, because nothing of it changes. */
export function EditionRow({ address, edition, holders, actions }: EditionRowProps) {
  const { n, seal, note } = edition;
  return (
    <li aria-labelledby={`edition-${n}`} className={`frozen border-t border-rule ${EDITION_GRID}`}>
      <div className="flex items-start gap-5">
        <Seal n={n} seal={seal} className="mt-0.5 flex-none" />
        <div className="min-w-0">
          <h2 id={`edition-${n}`} className="font-report text-[24px]/[30px] font-medium">
            Edition {n}
          </h2>
          <p className="mt-0.5 text-sm text-ink-2">
            {frozenWords(edition)}
            <br />
            {figureWords(edition)}
          </p>
        </div>
      </div>
      <div className="min-w-0">
        {note !== '' && (
          <p className="mb-3 max-w-[560px] font-report text-note text-ink-2 italic last:mb-0">{note}</p>
        )}
        {holders}
      </div>
      <div className="flex flex-col items-start gap-2 max-[1099.98px]:col-span-full max-[1099.98px]:flex-row max-[1099.98px]:flex-wrap max-[1099.98px]:items-center max-[1099.98px]:gap-x-4">
        {actions}
        <PdfLink address={address} n={n} />
        <WordLink
          className="mt-1 text-sm"
          to={paths.edition(address, n)}
          aria-label={`Lay beside the draft: edition ${n}`}
        >
          Lay beside the draft
        </WordLink>
      </div>
    </li>
  );
}
