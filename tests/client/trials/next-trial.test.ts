import { describe, expect, test } from 'vitest';
import type { Evidence, Quantity, Series } from '#shared/evidence/evidence.ts';
import { entryFields, firstText, readEntry, uncertaintyKey } from '#src/features/trials/view/next-trial.ts';

const quantity = (id: string, symbol: string, unit: string): Quantity => ({
  id,
  symbol,
  name: symbol,
  unit,
  status: 'measured',
  def: { origin: 'recorded', instrument: null },
});
const series: Series = { id: 's', letter: 'B', name: '', held: {}, settings: ['t'], readings: ['r'] };
const evidence: Evidence = {
  version: 1,
  settings: { k: 2, rounding: 'one or two digits', level: 0.95, paper: 'A4' },
  instruments: [],
  quantities: [quantity('t', 'θ', '°'), quantity('r', 'R', 'cm')],
  series: [series],
  trials: [
    {
      id: 'x',
      number: 1,
      series: 's',
      order: 1,
      by: 'Maren Tove',
      at: '2026-03-03T13:34:00Z',
      values: { t: { text: '45', unit: '°' }, r: { text: '45.0', unit: 'cm', u: '0.4' } },
    },
  ],
  models: [],
  comparisons: [],
  claims: [],
  charts: [],
};
const fields = entryFields(series, evidence);

describe('the entry bar', () => {
  test('when a trial was logged before: settings and uncertainty stay, the reading is empty', () => {
    expect(firstText(series, evidence)).toEqual({ t: '45', r: '', 't u': '', 'r u': '0.4' });
  });

  test('when an uncertainty stands beside the reading: both become one reading', () => {
    const entry = readEntry(fields, { t: '45', r: '44.7', [uncertaintyKey('r')]: '0.4' });

    expect(entry.values.r).toEqual({ text: '44.7', unit: 'cm', u: '0.4' });
    expect(entry.missing).toEqual([]);
  });

  test('when a unit is typed: it is kept as typed and said', () => {
    const entry = readEntry(fields, { t: '45', r: '447 mm' });

    expect(entry.values.r).toEqual({ text: '447', unit: 'mm' });
    expect(entry.understood.r).toContain('447');
  });

  test('when a field cannot be understood: only that field is wrong', () => {
    const entry = readEntry(fields, { t: '45', r: '44,7.1' });

    expect(Object.keys(entry.faults)).toEqual(['r']);
    expect(entry.values.t).toEqual({ text: '45', unit: '°' });
  });

  test('when a reading is missing: it is named, not guessed', () => {
    expect(readEntry(fields, { t: '45', r: ' ' }).missing).toEqual(['r']);
  });
});
