import type { Quantity } from '#shared/evidence/evidence.ts';
import { splitSymbol } from '#shared/formatting/symbol.ts';
import { unitToText } from '#shared/formatting/unit-text.ts';
import { plain, type TextRun } from './rich-text.ts';

/**
 * A quantity's symbol as it is set in a label: the letter in italic, its subscript upright.
 *
 * @param symbol - as the register has it, `C_v`
 * @example symbolRuns('C_v').map((run) => run.style) // => ['symbol', 'subscript']
 */
export function symbolRuns(symbol: string): TextRun[] {
  const parts = splitSymbol(symbol);
  if (parts === null) return [{ text: symbol, style: 'symbol' }];
  const letter: TextRun = { text: parts.letter, style: 'symbol' };
  return parts.sub ? [letter, { text: parts.sub, style: 'subscript' }] : [letter];
}

/** The head of a table's column or the title of an axis: "R / cm", or the symbol alone for a pure number. */
export function quantityLabel(quantity: Quantity): TextRun[] {
  const unit = quantity.unit === '1' ? '' : unitToText(quantity.unit);
  return unit === '' ? symbolRuns(quantity.symbol) : [...symbolRuns(quantity.symbol), plain(` / ${unit}`)];
}

/** The same with the quantity's name before it when the name is one word: "lean θ / °". */
export function namedQuantityLabel(quantity: Quantity): TextRun[] {
  const firstWord = quantity.name.split(/\s+/u)[0] ?? '';
  return firstWord.length > 1 && firstWord.length <= 12
    ? [plain(`${firstWord} `), ...quantityLabel(quantity)]
    : quantityLabel(quantity);
}
