import type { MovedPassage, TextPiece } from '#shared/editions/edition-comparison.ts';
import { REPORT_SECTIONS } from '#shared/report/schema/section-type.ts';
import { Katex } from '#src/components/katex.tsx';
import { classNames } from '#src/lib/class-names.ts';

const SAID = { added: 'Added', removed: 'Taken out', changed: 'Changed' } as const;

/** Passages that moved, under their sections: what was taken out is struck, what came is underlined. */
export function PassageList({ passages }: { readonly passages: readonly MovedPassage[] }) {
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
            <Passage key={index} passage={passage} />
          ))}
        </ol>
      </section>
    ));
}

function Passage({ passage: { change, pieces } }: { readonly passage: MovedPassage }) {
  return (
    <li className="grid grid-cols-[92px_minmax(0,610px)] gap-x-5 border-t border-hair py-3 first:border-t-0 max-sm:grid-cols-1">
      <span className="pt-1 text-xs text-ink-3">{SAID[change]}</span>
      <p
        className={classNames(
          'font-report text-report wrap-break-word',
          change === 'removed' && 'text-ink-3',
        )}
      >
        {pieces.map((piece, index) => (
          <Piece key={index} piece={piece} />
        ))}
      </p>
    </li>
  );
}

function Piece({ piece }: { readonly piece: TextPiece }) {
  const content = <PieceText piece={piece} />;
  if (piece.change === 'added') {
    return <ins className="decoration-ink decoration-[1.25px] underline-offset-4">{content}</ins>;
  }
  if (piece.change === 'removed') return <del className="text-ink-3">{content}</del>;
  return content;
}

function PieceText({ piece: { kind, text } }: { readonly piece: TextPiece }) {
  const words = text.trimStart();
  const space = text.length > words.length ? ' ' : '';
  if (kind === 'formula') {
    return (
      <>
        {space}
        <Katex latex={words} />
      </>
    );
  }
  if (kind === 'value') {
    return (
      <>
        {space}
        <span className="whitespace-nowrap">{words}</span>
      </>
    );
  }
  if (kind === 'part') return <span className="font-medium">{text}</span>;
  return text;
}
