import { splitSymbol, symbolToSpeech } from '#shared/formatting/symbol.ts';

/** A quantity's symbol as one writes it: italic, with an upright subscript. */
export function QuantitySymbol({ symbol }: { readonly symbol: string }) {
  const parts = splitSymbol(symbol);
  return (
    <span className="sym">
      <span aria-hidden="true">
        {parts?.letter ?? symbol}
        {parts?.sub && <sub>{parts.sub}</sub>}
      </span>
      <span className="sr-only">{symbolToSpeech(symbol)}</span>
    </span>
  );
}
