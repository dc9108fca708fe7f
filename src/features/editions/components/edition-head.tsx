import type { Edition } from '#shared/contracts/editions.ts';
import { Seal } from '#src/components/seal.tsx';
import { WordLink } from '#src/components/word.tsx';
import { paths } from '#src/lib/paths.ts';
import type { ProblemAddress } from '#src/lib/problem/problem-address.ts';
import { figureWords, frozenWords } from '../sentences/say-when.ts';
import { PdfLink } from './pdf-link.tsx';

interface EditionHeadProps {
  readonly address: ProblemAddress;
  readonly edition: Edition;
}

/** Which edition this is, with its seal, its note and its PDF. */
export function EditionHead({ address, edition }: EditionHeadProps) {
  const { n, seal, note } = edition;
  return (
    <header className="flex flex-wrap items-start gap-x-6 gap-y-4 max-sm:px-4.5">
      <Seal n={n} seal={seal} className="flex-none" />
      <div className="min-w-0 flex-1 basis-64">
        <h1 className="h1">Edition {n}</h1>
        <p className="text-sm text-ink-2">
          {frozenWords(edition)}; {figureWords(edition)}
        </p>
        {note !== '' && (
          <p className="mt-1.5 max-w-[610px] font-report text-note text-ink-2 italic">{note}</p>
        )}
      </div>
      <div className="flex flex-wrap items-center gap-4">
        <PdfLink address={address} n={n} />
        <WordLink className="text-sm" to={paths.station(address, 'editions')}>
          All editions
        </WordLink>
      </div>
    </header>
  );
}
