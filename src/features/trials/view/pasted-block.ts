import type { Quantity, Reading } from '#shared/evidence/evidence.ts';
import { parseTypedNumber } from '#shared/units/typed-number.ts';
import type { EntryField } from './next-trial.ts';

/** One column of what was pasted, and the quantity it is taken for; null: left out. */
export interface PastedColumn {
  readonly head: string | null;
  readonly quantity: Quantity | null;
  /** Unit the cells are read in, where a cell names none. */
  readonly unit: string;
}

export interface PastedRow {
  /** Line of the paste, from 1. */
  readonly line: number;
  readonly cells: readonly string[];
  readonly values: Readonly<Record<string, Reading>>;
  /** What is wrong with this row, a sentence for each column, by column index. */
  readonly faults: Readonly<Record<number, string>>;
}

export interface PastedBlock {
  readonly columns: readonly PastedColumn[];
  readonly rows: readonly PastedRow[];
  /** Why nothing of it can be used; null: some rows can. */
  readonly sentence: string | null;
}

const MOST_ROWS = 500;

/**
 * Reads a block copied from a spreadsheet: cells parted by tabs, semicolons or (where no decimal comma is
 * possible) commas. A first line without numbers is taken as heads. `chosen` overrides which quantity a column is.
 */
export function readPastedBlock(
  text: string,
  fields: readonly EntryField[],
  chosen: Readonly<Record<number, string | null>> = {},
): PastedBlock {
  const lines = text
    .replace(/\r\n?/g, '\n')
    .split('\n')
    .map((line, index) => ({ line: index + 1, text: line }))
    .filter((line) => line.text.trim() !== '' && !/^\s*[#%]/.test(line.text));
  if (lines.length === 0)
    return nothing('Nothing was pasted. Copy the rows in the spreadsheet, then paste them here.');
  const separator = separatorOf(lines.map((line) => line.text));
  const table = lines.map((line) => ({
    line: line.line,
    cells: line.text.split(separator).map((cell) => cell.trim()),
  }));
  const heads = table[0] && !table[0].cells.some((cell) => /^[\d.,+-]/.test(cell)) ? table[0].cells : null;
  const body = heads ? table.slice(1) : table;
  if (body.length === 0) return nothing('There is a head but no row below it.');
  if (body.length > MOST_ROWS) {
    return nothing(
      `${body.length} rows were pasted; at most ${MOST_ROWS} are logged at once. Paste them in parts.`,
    );
  }
  const width = Math.max(...table.map(({ cells }) => cells.length));
  const columns = columnsFor(width, heads, fields, chosen);
  return { columns, rows: body.map((row) => readRow(row.line, row.cells, columns)), sentence: null };
}

function nothing(sentence: string): PastedBlock {
  return { columns: [], rows: [], sentence };
}

function separatorOf(lines: readonly string[]): string | RegExp {
  if (lines.every((line) => line.includes('\t'))) return '\t';
  if (lines.every((line) => line.includes(';'))) return ';';
  if (lines.every((line) => line.includes('\t') || !/[;,]/.test(line))) return '\t';
  return lines.some((line) => /\d,\d/.test(line) && !/\d\.\d/.test(line)) &&
    !lines.every((line) => line.includes(', '))
    ? '\t'
    : ',';
}

/** By head first (symbol or name, with an optional unit), then by the order of the entry bar. */
function columnsFor(
  width: number,
  heads: readonly string[] | null,
  fields: readonly EntryField[],
  chosen: Readonly<Record<number, string | null>>,
): PastedColumn[] {
  const taken = new Set<string>();
  return Array.from({ length: width }, (_, index) => {
    const head = heads?.[index] ?? null;
    const override = chosen[index];
    const field =
      override !== undefined
        ? fields.find(({ quantity }) => quantity.id === override)
        : head
          ? fields.find(({ quantity }) => !taken.has(quantity.id) && namesQuantity(head, quantity))
          : fields[index];
    if (field) taken.add(field.quantity.id);
    return { head, quantity: field?.quantity ?? null, unit: unitInHead(head) ?? field?.quantity.unit ?? '1' };
  });
}

function namesQuantity(head: string, quantity: Quantity): boolean {
  const bare = head.replace(/\s*[[(/].*$/, '').trim();
  const same = (a: string, b: string) => a.localeCompare(b, 'en', { sensitivity: 'accent' }) === 0;
  return bare === quantity.symbol || same(bare, quantity.name);
}

/** `h (mm)`, `h [mm]`, `h / mm` */
function unitInHead(head: string | null): string | null {
  return head?.match(/(?:\(|\[|\/\s*)([^)\]]+?)(?:\)|\])?\s*$/)?.[1]?.trim() ?? null;
}

function readRow(line: number, cells: readonly string[], columns: readonly PastedColumn[]): PastedRow {
  const values: Record<string, Reading> = {};
  const faults: Record<number, string> = {};
  columns.forEach(({ quantity, unit }, index) => {
    if (!quantity) return;
    const cell = cells[index] ?? '';
    if (cell === '') {
      faults[index] = `Line ${line} has no ${quantity.name}.`;
      return;
    }
    const parsed = parseTypedNumber(cell, unit);
    if (parsed.ok) values[quantity.id] = parsed.reading;
    else faults[index] = `Line ${line}: ${parsed.sentence}`;
  });
  return { line, cells, values, faults };
}
