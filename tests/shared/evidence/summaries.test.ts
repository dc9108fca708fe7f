/** Statistics of a column as quantities of the register. */
import { describe, expect, test } from 'vitest';
import { evaluate } from '#shared/evidence/evaluate.ts';
import type { Evidence, QuantityDefinition, Statistic } from '#shared/evidence/evidence.ts';
import type { Scalar } from '#shared/evidence/findings.ts';
import { evidence, quantity, reading, recorded, ruler, series, trial } from './small-evidence.ts';

const WEIGHTS = ['1', '1', '2', '2', '3', '3'];
const LENGTHS = ['10.0', '10.4', '12.1', '12.3', '14.0', '14.6'];

function withSummary(
  stat: Statistic,
  options: Partial<Extract<QuantityDefinition, { origin: 'summary' }>> = {},
  unit = 'mm',
): Evidence {
  return evidence({
    instruments: [ruler('ruler', '0.05', '0.2', 'mm')],
    quantities: [
      recorded('w', 'g'),
      recorded('L', 'mm', 'ruler'),
      quantity('q', unit, {
        origin: 'summary',
        of: 'L',
        stat,
        where: { series: ['A'], plusTrials: [], where: [] },
        scatter: 'group',
        ...options,
      }),
    ],
    series: [series('A', ['w'], ['L'])],
    trials: LENGTHS.map((length, i) =>
      trial('A', i + 1, { w: reading(WEIGHTS[i] ?? '', 'g'), L: reading(length, 'mm') }),
    ),
  });
}

function summaryOf(of: Evidence): Scalar {
  const found = evaluate(of).values.get('q');
  if (found?.shape !== 'scalar') throw new Error(JSON.stringify(found));
  return found;
}

const atTwo = {
  series: ['A'],
  plusTrials: [],
  where: [{ quantity: 'w', min: reading('2', 'g'), max: reading('2', 'g') }],
};

describe('summaries', () => {
  test.each([
    ['mean', 12.233333333333333],
    ['median', 12.2],
    ['minimum', 10],
    ['maximum', 14.6],
    ['standard deviation', 1.84896],
  ] as const)('%s of all six lengths is %d mm', (stat, expected) => {
    expect(summaryOf(withSummary(stat)).value * 1000).toBeCloseTo(expected, 3);
  });

  test('count: how many there are, exact', () => {
    expect(summaryOf(withSummary('count', {}, '1'))).toMatchObject({ value: 6, u: null, hue: 'count' });
  });

  test('a mean over a range: only those inside, with the ruler’s common part whole', () => {
    const found = summaryOf(withSummary('mean', { where: atTwo }));

    expect(found.value).toAgreeTo(0.0122, { digits: 12 });
    expect(found.u).toAgreeTo(Math.hypot(0.0001, 0.0002), { digits: 9 });
    expect(found.madeOf).toMatchObject({ kind: 'mean', trials: ['A3', 'A4'] });
  });

  test('pooled scatter: from all settings, with its degrees of freedom', () => {
    const found = summaryOf(withSummary('mean', { scatter: 'pooled' }));
    const pooled = Math.sqrt((0.08 + 0.02 + 0.18) / 3) / 1000;

    expect(found.madeOf).toMatchObject({ scatterKind: 'pooled', scatter: expect.closeTo(pooled, 9) });
    expect(found.u).toAgreeTo(Math.hypot(pooled / Math.sqrt(6), 0.0002), { digits: 9 });
  });

  test('a slope: through all points, in its own unit, and the ruler’s zero plays no part', () => {
    const found = summaryOf(withSummary('slope', { against: 'w' }, 'mm/g'));

    expect(found.value).toAgreeTo(2.05, { digits: 9 });
    expect(found.parts.map(({ source }) => source)).toEqual(['mean:q']);
    expect(found.degreesOfFreedom).toBeCloseTo(4, 9);
  });

  test('the largest: has the u of that one reading', () => {
    expect(summaryOf(withSummary('maximum')).parts).toEqual([
      { source: 'trial:A6:L', c: expect.closeTo(0.00005, 12) },
      { source: 'inst:ruler:offset', c: expect.closeTo(0.0002, 12) },
    ]);
  });

  test('a mean used further: its scatter is one source with n − 1 degrees of freedom', () => {
    const of = withSummary('mean', { where: { series: [], plusTrials: ['A5', 'A6'], where: [] } });
    const twice = {
      ...of,
      quantities: [...of.quantities, quantity('t', 'mm', { origin: 'derived', expr: '2*{q}' })],
    };

    const found = evaluate(twice);

    expect(found.values.get('t')).toMatchObject({ value: expect.closeTo(0.0286, 9) });
    expect(found.sources.get('mean:q')).toMatchObject({ kind: 'scatter', degreesOfFreedom: 1 });
  });
});
