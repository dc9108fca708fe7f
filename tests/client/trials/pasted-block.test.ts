import { describe, expect, test } from 'vitest';
import type { Quantity } from '#shared/evidence/evidence.ts';
import { readPastedBlock } from '#src/features/trials/view/pasted-block.ts';
import type { EntryField } from '#src/features/trials/view/next-trial.ts';

const quantity = (id: string, symbol: string, name: string, unit: string): Quantity => ({
  id,
  symbol,
  name,
  unit,
  status: 'measured',
  def: { origin: 'recorded', instrument: null },
});
const fields: EntryField[] = [
  { quantity: quantity('q-t', 'θ', 'lean', '°'), kind: 'setting' },
  { quantity: quantity('q-r', 'R', 'range', 'cm'), kind: 'reading' },
];

describe('a pasted block', () => {
  test('without heads: columns are taken in the order of the entry bar', () => {
    const block = readPastedBlock('38\t46.1\n38\t46.3', fields);

    expect(block.rows.map(({ values }) => values)).toEqual([
      { 'q-t': { text: '38', unit: '°' }, 'q-r': { text: '46.1', unit: 'cm' } },
      { 'q-t': { text: '38', unit: '°' }, 'q-r': { text: '46.3', unit: 'cm' } },
    ]);
  });

  test('with heads: columns go by symbol or name, in the unit that the head names', () => {
    const block = readPastedBlock('Range / mm;θ\n461;38', fields);

    expect(block.columns.map(({ quantity: taken, unit }) => [taken?.id, unit])).toEqual([
      ['q-r', 'mm'],
      ['q-t', '°'],
    ]);
    expect(block.rows[0]?.values['q-r']).toEqual({ text: '461', unit: 'mm' });
  });

  test('with a cell that is no number: says in which line, and keeps the others', () => {
    const block = readPastedBlock('38\t46.1\n38\tabout 46', fields);

    expect(block.rows[0]?.faults).toEqual({});
    expect(block.rows[1]?.faults[1]).toMatch(/^Line 2: /);
  });

  test('with both decimal marks in one number: refuses to guess', () => {
    const block = readPastedBlock('38\t1,234.5', fields);

    expect(block.rows[0]?.faults[1]).toBeTruthy();
  });

  test('with a missing cell: names the quantity that is missing', () => {
    const block = readPastedBlock('38\t46.1\n38\t', fields);

    expect(block.rows[1]?.faults[1]).toBe('Line 2 has no range.');
  });

  test('with more rows than are logged at once: says how many', () => {
    const block = readPastedBlock(Array.from({ length: 501 }, () => '38\t46').join('\n'), fields);

    expect(block.sentence).toContain('501');
  });

  test('with a column chosen by hand: that choice counts', () => {
    const block = readPastedBlock('46.1\t38', fields, { 0: 'q-r', 1: 'q-t' });

    expect(block.rows[0]?.values['q-r']).toEqual({ text: '46.1', unit: 'cm' });
  });
});
