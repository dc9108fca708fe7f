import { Fragment } from 'react';
import { splitSymbol } from '#shared/formatting/symbol.ts';

/** Symbols in a computed sentence: `C_v`, a Greek letter alone, and the u of "2.3 u". */
const SYMBOLS = /(?<![\p{L}\d_])([\p{L}]+_[\p{L}\d]+|[α-ωΑ-Ω](?![\p{L}])|(?<=\d[\s\u00a0])u(?![\p{L}]))/gu;

/** A sentence that the core made, with its symbols set as symbols. */
export function SentenceText({ text }: { readonly text: string }) {
  const pieces = text.split(SYMBOLS);
  return (
    <>
      {pieces.map((piece, index) => (
        <Fragment key={index}>{index % 2 === 0 ? piece : <InlineSymbol symbol={piece} />}</Fragment>
      ))}
    </>
  );
}

function InlineSymbol({ symbol }: { readonly symbol: string }) {
  const parts = splitSymbol(symbol);
  return (
    <span className="sym">
      {parts?.letter ?? symbol}
      {parts?.sub && <sub>{parts.sub}</sub>}
    </span>
  );
}
