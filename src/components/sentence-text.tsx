import { Fragment, type ReactNode } from 'react';
import { splitSymbol } from '#shared/formatting/symbol.ts';

/**
 * What is set apart in a computed sentence: a value after "predicted", "give" or "measured", the p of a test with its
 * figure, and symbols: `C_v`, a Greek letter alone, the u of "2.3 u", a letter alone.
 */
const PIECES =
  /((?<=\b(?:predicted|give|measured) )(?![^,;.]*\b(?:less|more)\b)[\d\u2212][^,;]*?(?=[,;]|\.(?:\s|$)|$)|(?<![\p{L}\d_])p(?: = [\d.]+| = |(?= lies)| ?< ?[\d.]+)|(?<![\p{L}\d_])[\p{L}]+_[\p{L}\d]+|(?<![\p{L}\d_])[α-ωΑ-Ω](?![\p{L}])|(?<=\d[\s\u00a0])u(?![\p{L}])|(?<!series |\d[\s\u00a0]|[\p{L}\d_’'])\p{L}(?![\p{L}\d_’']))/gu;

interface SentenceTextProps {
  readonly text: string;
  /** The problem's symbols: a letter that stands alone is set as a symbol only if it is one of them. */
  readonly symbols?: readonly string[];
}

/** A sentence that the core made, with its values in their hue and its symbols set as symbols. */
export function SentenceText({ text, symbols = [] }: SentenceTextProps) {
  const pieces = text.split(PIECES);
  return (
    <>
      {pieces.map((piece, index) => (
        <Fragment key={index}>
          {index % 2 === 0 ? piece : setApart(piece, pieces[index - 1] ?? '', symbols)}
        </Fragment>
      ))}
    </>
  );
}

function setApart(piece: string, before: string, symbols: readonly string[]): ReactNode {
  if (/^[\d\u2212]/u.test(piece)) {
    const hue = before.endsWith('measured ') ? 'text-measured' : 'text-predicted';
    return <span className={`font-medium ${hue}`}>{piece}</span>;
  }
  if (/^p(?: |$)/u.test(piece)) {
    return (
      <span className="whitespace-nowrap">
        <span className="sym">p</span>
        {piece.slice(1)}
      </span>
    );
  }
  const isPlainLetter = /^[A-Za-z]$/u.test(piece) && !(piece === 'u' && /\d[\s\u00a0]$/u.test(before));
  return isPlainLetter && !symbols.includes(piece) ? piece : <InlineSymbol symbol={piece} />;
}

function InlineSymbol({ symbol }: { readonly symbol: string }) {
  const parts = splitSymbol(symbol);
  return (
    // The tail of χ reaches under what stands before it.
    <span className={symbol === 'χ' ? 'sym ml-[0.16em]' : 'sym'}>
      {parts?.letter ?? symbol}
      {parts?.sub && <sub>{parts.sub}</sub>}
    </span>
  );
}
