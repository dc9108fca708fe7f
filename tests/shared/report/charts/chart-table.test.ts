import { expect, test } from 'vitest';
import { chartTable } from '#shared/report/charts/chart-table.ts';
import { SAMPLE_EVIDENCE, sampleFinding, samplePoint } from './sample-finding.ts';

const { settings } = SAMPLE_EVIDENCE;

test('chart as a table, when seen: has a row for each setting and one for each excluded trial', () => {
  const { head, rows } = chartTable(sampleFinding(), SAMPLE_EVIDENCE, settings);

  expect(head).toEqual(['θ / °', 'R measured', 'R predicted', 'difference', 'z', 'trials']);
  expect(rows).toHaveLength(8);
  expect(rows.every((row) => row.length === head.length)).toBe(true);
});

test('row of a setting, when seen: says measured, predicted, difference, z and its trials', () => {
  const [row] = chartTable(
    sampleFinding({ points: [samplePoint(38, 46.43, -2.2)] }),
    SAMPLE_EVIDENCE,
    settings,
  ).rows;

  expect(row?.[0]).toBe('38');
  expect(row?.[1]?.replaceAll(/\s/gu, ' ')).toMatch(/^46\.4 ± 0\.4 cm$/u);
  expect(row?.[2]?.replaceAll(/\s/gu, ' ')).toMatch(/^47\.9 ± 0\.5 cm$/u);
  expect(row?.[4]).toBe('−2.2');
  expect(row?.[5]).toBe('B28, B29');
});

test('row of an excluded trial, when seen: says so', () => {
  const { rows } = chartTable(sampleFinding(), SAMPLE_EVIDENCE, settings);

  expect(rows.at(-1)?.map((cell) => cell.replaceAll(/\s/gu, ' '))).toEqual(
    ['38', '43.5 cm', '', '', '', 'B11, excluded'].map((cell, i) => (i === 0 ? '38°' : cell)),
  );
});

test('a chart of a quantity that is gone, when asked: is a mistake of the caller', () => {
  expect(() => chartTable(sampleFinding({ y: 'gone' }), SAMPLE_EVIDENCE, settings)).toThrow(RangeError);
});
