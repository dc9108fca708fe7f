import type { Evidence, Reading } from '#shared/evidence/evidence.ts';
import { symbolToText } from '#shared/formatting/symbol.ts';
import { readingText } from './reading-text.ts';

/**
 * A setting in words: `45°` when one thing is set, else `h = 20.0 cm, θ = 45°`; empty when nothing is.
 *
 * @param at - what is set, by quantity id
 */
export function settingWords(at: Readonly<Record<string, Reading>>, evidence: Evidence): string {
  const entries = Object.entries(at);
  const [only] = entries;
  if (only !== undefined && entries.length === 1) return readingText(only[1]);
  return entries
    .map(([id, reading]) => {
      const symbol = evidence.quantities.find((quantity) => quantity.id === id)?.symbol ?? '?';
      return `${symbolToText(symbol)} = ${readingText(reading)}`;
    })
    .join(', ');
}
