import type { MovedPassage, TextPiece } from '#shared/editions/edition-comparison.ts';
import { REPORT_SECTIONS } from '#shared/report/schema/section-type.ts';
import { Katex } from '#src/components/katex.tsx';
import { SentenceText } from '#src/components/sentence-text.tsx';
import { useSymbols } from '../view/use-symbols.ts';

const SAID = { added: 'Added', removed: 'Taken out', changed: 'Changed' } as const;

/** Passages that moved, under their sections: what was taken out is struck, what came is underlined. */
export function PassageList({ passages }: { readonly passages: readonly MovedPassage[] }) {
  const symbols = useSymbols();
  const sections = REPORT_SECTIONS.map(({ number, name }) => ({
    number,
    name,
    passages: passages.filter(({ section }) => section === number),
  }));
  return sections
    .filter((section) => section.passages.length > 0)
    .map(({ number, name, passages: own }) => (
      <section key={number} aria-labelledby={`words-${number}`} className="mt-5">
        <h3 id={`words-${number}`} className="font-report text-lg font-medium">
          <span className="mr-2.5 text-ink-3">{number}</span>
          {name}
        </h3>
        <ol>
          {own.map((passage, index) => (
            <Passage key={index} passage={passage} symbols={symbols} />
          ))}
        </ol>
      </section>
    ));
}

interface PassageProps {
  readonly passage: MovedPassage;
  readonly symbols: readonly string[];
}

function Passage({ passage: { change, pieces }, symbols }: PassageProps) {
  return (
    <li className="grid grid-cols-[92px_minmax(0,610px)] gap-x-5 border-t border-hair py-3 first:border-t-0 max-sm:grid-cols-1">
      <span className="pt-1 text-xs text-ink-3">{SAID[change]}</span>
      <p className="font-report text-report wrap-break-word">
        {pieces.map((piece, index) => (
          // A passage that is new as a whole is called so; underlining all of it would say nothing more.
          <Piece key={index} piece={piece} isMarked={change !== 'added'} symbols={symbols} />
        ))}
      </p>
    </li>
  );
}

interface PieceProps {
  readonly piece: TextPiece;
  readonly isMarked: boolean;
  readonly symbols: readonly string[];
}

function Piece({ piece, isMarked, symbols }: PieceProps) {
  const content = <PieceText piece={piece} symbols={symbols} />;
  if (piece.change === 'added') {
    return (
      <ins className={isMarked ? 'decoration-ink decoration-[1.25px] underline-offset-4' : 'no-underline'}>
        {content}
      </ins>
    );
  }
  if (piece.change === 'removed') return <del className="text-ink-3">{content}</del>;
  return content;
}

function PieceText({ piece: { kind, text }, symbols }: Pick<PieceProps, 'piece' | 'symbols'>) {
  const words = text.trimStart();
  const space = text.length > words.length ? ' ' : '';
  if (kind === 'text') return text;
  if (kind === 'part') {
    return (
      <span className="font-medium">
        <SentenceText text={text} symbols={symbols} />
      </span>
    );
  }
  return (
    <>
      {space}
      {kind === 'formula' ? (
        <Katex latex={words} />
      ) : (
        <span className="whitespace-nowrap">
          <SentenceText text={words} symbols={symbols} />
        </span>
      )}
    </>
  );
}
