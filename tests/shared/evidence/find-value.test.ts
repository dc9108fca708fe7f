/** What live values point at: means, predictions, readings, counts, figures and differences. */
import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { leaningSpoutEvidence } from '#server/database/seeders/demo/leaning-spout-evidence.ts';
import { evaluate } from '#shared/evidence/evaluate.ts';
import type { Evidence, ValueReference } from '#shared/evidence/evidence.ts';
import { findSource } from '#shared/evidence/find-source.ts';
import { findValue } from '#shared/evidence/find-value.ts';
import type { Scalar } from '#shared/evidence/findings.ts';
import { keyOf } from '#shared/evidence/keys.ts';
import { predictAt } from '#shared/evidence/predict.ts';
import { readValue } from '#shared/evidence/read-value.ts';
import { readSi } from '#shared/units/reading.ts';
import {
  constant,
  derived,
  evidence,
  instrument,
  reading,
  recorded,
  ruler,
  series,
  spring,
  trial,
} from './small-evidence.ts';

function scalar(of: Evidence, ref: ValueReference): Scalar {
  const found = findValue(evaluate(of), of, ref);
  if (found.shape === 'fault') throw new Error(found.sentence);
  return found;
}

const spout = leaningSpoutEvidence(new Date('2026-03-03T12:00:00.000Z'));
const findings = evaluate(spout);
const at38 = { 'q-theta': reading('38', '°') };
const mean: ValueReference = { kind: 'mean', quantity: 'q-r', series: 'series-b', at: at38 };
const prediction: ValueReference = {
  kind: 'prediction',
  model: 'model-3',
  quantity: 'q-r',
  series: 'series-b',
  at: at38,
};

describe('means', () => {
  test('scatter over √n, then the tray’s common part undivided', () => {
    const found = scalar(spout, mean);
    const scatter = Math.hypot(46.1 - 46.4333333, 46.3 - 46.4333333, 46.9 - 46.4333333) / Math.sqrt(2) / 100;

    expect(found.parts.map(({ source }) => source.split(':')[0])).toEqual(['mean', 'inst']);
    expect(found.u).toAgreeTo(Math.hypot(scatter / Math.sqrt(3), 0.001), { digits: 6 });
    expect(found.madeOf).toMatchObject({ kind: 'mean', scatterKind: 'group', leftOut: ['trial-b11'] });
  });

  test('repeats that scatter less than the instrument: its own part over √n stands', () => {
    const found = scalar(spout, { ...mean, at: { 'q-theta': reading('10.0', '°') } });

    expect(found.u).toAgreeTo(Math.hypot(0.004 / Math.sqrt(3), 0.001), { digits: 12 });
    expect(found.madeOf).toMatchObject({ scatterKind: 'instrument' });
  });

  test('two trials: the scatter is poorly known, and it is said', () => {
    const found = scalar(spring(), {
      kind: 'mean',
      quantity: 'L',
      series: 'A',
      at: { w: reading('0.05', 'kg') },
    });
    const two = {
      ...spring(),
      trials: spring()
        .trials.filter(({ id }) => id !== 'A3')
        .map((row) =>
          row.id === 'A2' ? trial('A', 2, { w: reading('50', 'g'), L: reading('112', 'mm') }) : row,
        ),
    };

    expect(found.warnings).toEqual([]);
    expect(
      scalar(two, { kind: 'mean', quantity: 'L', series: 'A', at: { w: reading('50', 'g') } }).warnings,
    ).toEqual(['Two trials only: their scatter is poorly known.']);
  });

  test('a part that the scatter does not contain: is added even where the scatter is larger', () => {
    const of = evidence({
      instruments: [
        instrument('gauge', [
          { kind: 'resolution', amount: '0.1', unit: 'mm', shape: 'rectangular', shared: false },
          { kind: 'stated', amount: '0.3', unit: 'mm', shape: 'normal', shared: false, notInScatter: true },
        ]),
      ],
      quantities: [recorded('L', 'mm', 'gauge')],
      series: [series('A', [], ['L'])],
      trials: ['10', '12', '14'].map((text, i) => trial('A', i + 1, { L: reading(text, 'mm') })),
    });

    expect(scalar(of, { kind: 'mean', quantity: 'L', series: 'A', at: {} }).u).toAgreeTo(
      Math.hypot(0.002 / Math.sqrt(3), 0.0003 / Math.sqrt(3)),
      { digits: 12 },
    );
  });

  test('a setting: is itself, with its own u once', () => {
    expect(scalar(spout, { ...mean, quantity: 'q-theta' })).toMatchObject({
      value: expect.closeTo((38 * Math.PI) / 180, 12),
      u: expect.closeTo((0.5 * Math.PI) / 180, 12),
    });
  });

  test('no trial there, or none kept: no trials', () => {
    const none = findValue(findings, spout, { ...mean, at: { 'q-theta': reading('39', '°') } });

    expect(none).toMatchObject({ code: 'no trials', sentence: 'Series B has no trial at θ = 39°.' });
  });
});

describe('predictions', () => {
  test('at a logged setting: the setting’s own doubt, the head’s and the fit’s stand behind it', () => {
    const found = scalar(spout, prediction);

    expect(found.hue).toBe('predicted');
    expect(found.value).toAgreeTo(0.47936, { digits: 4 });
    expect(found.parts.map(({ source }) => source)).toEqual(
      expect.arrayContaining([
        'fit:c-upright:0',
        'held:series-b:q-h:own',
        'const:q-y:own',
        'inst:i-tray:offset',
      ]),
    );
    expect(found.madeOf).toMatchObject({
      kind: 'expression',
      refs: expect.arrayContaining([{ kind: 'mean', quantity: 'q-theta', series: 'series-b', at: at38 }]),
    });
  });

  test('at a setting not logged yet: has the protractor’s doubt; outside trust it says so', () => {
    const inside = predictAt(spout, findings, {
      model: 'model-3',
      quantity: 'q-r',
      series: 'series-b',
      values: { 'q-theta': reading('41', '°') },
    });
    const outside = predictAt(spout, findings, {
      model: 'model-3',
      quantity: 'q-r',
      series: 'series-b',
      values: { 'q-theta': reading('70', '°') },
    });

    expect(inside).toMatchObject({ shape: 'scalar', warnings: [] });
    expect(
      inside.shape === 'scalar' &&
        inside.parts.some(({ source }) => source.startsWith('set:q-theta@series-b')),
    ).toBe(true);
    expect(outside).toMatchObject({ warnings: ['θ lies outside the range in which model 3 is trusted.'] });
  });

  test('a setting that the model needs and nobody gave: says which', () => {
    const found = predictAt(spout, findings, {
      model: 'model-3',
      quantity: 'q-r',
      series: 'series-b',
      values: {},
    });

    expect(found).toMatchObject({ shape: 'fault', code: 'missing input' });
    expect(found.shape === 'fault' && found.sentence).toMatch(
      /θ is read trial by trial in series B\. Say at which value of θ\./u,
    );
  });

  test('a quantity that the model does not define: says so', () => {
    expect(
      predictAt(spout, findings, { model: 'model-1', quantity: 'q-rmax', series: 'series-b', values: {} }),
    ).toMatchObject({
      code: 'missing input',
      sentence: 'Model 1 has no equation for R_max. Add one, or choose another model.',
    });
  });
});

describe('readings, counts and figures', () => {
  test('one reading: its own u and the common part', () => {
    expect(scalar(spout, { kind: 'reading', trial: 'trial-b12', quantity: 'q-r' })).toMatchObject({
      value: 0.463,
      u: expect.closeTo(Math.hypot(0.004, 0.001), 12),
    });
  });

  test.each([
    [{ kind: 'count', of: 'trials' }, 31],
    [{ kind: 'count', of: 'kept', series: 'series-b' }, 18],
    [{ kind: 'count', of: 'excluded' }, 1],
    [{ kind: 'count', of: 'used', comparison: 'c-upright' }, 10],
    [{ kind: 'fit', comparison: 'c-upright', figure: 'degrees of freedom' }, 9],
    [{ kind: 'claim', claim: 'claim-3', figure: 'k' }, 2],
  ] as const)('%j is %d', (ref, expected) => {
    expect(scalar(spout, ref).value).toBe(expected);
  });

  test('z and the difference of a claim: are those of its verdict', () => {
    expect(scalar(spout, { kind: 'claim', claim: 'claim-3', figure: 'z' }).value).toBe(
      findings.claims.get('claim-3')?.z,
    );
    expect(scalar(spout, { kind: 'claim', claim: 'claim-3', figure: 'difference' }).hue).toBe('difference');
  });

  test('a column asked for as one value: no single value', () => {
    expect(
      findValue(findings, spout, { kind: 'quantity', quantity: 'q-r', series: 'series-b' }),
    ).toMatchObject({ code: 'no single value' });
  });

  test('a quantity that a series neither reads nor holds: says where it is missing', () => {
    const of = { ...spring(), series: [...spring().series, series('B', ['w'], [])] };

    expect(findValue(evaluate(of), of, { kind: 'quantity', quantity: 'L', series: 'B' })).toMatchObject({
      code: 'missing input',
      sentence: 'L is neither read nor held in series B.',
    });
  });
});

describe('differences', () => {
  test('x − x is exactly 0 ± 0', () => {
    expect(scalar(spout, { kind: 'difference', a: mean, b: mean })).toMatchObject({
      value: 0,
      u: 0,
      parts: [],
    });
  });

  test('measured less predicted: what both share counts once, with its sign', () => {
    const found = scalar(spout, { kind: 'difference', a: mean, b: prediction });
    const [a, b] = [scalar(spout, mean), scalar(spout, prediction)];
    const tray = (of: Scalar): number =>
      of.parts.find(({ source }) => source === 'inst:i-tray:offset')?.c ?? NaN;

    expect(tray(found)).toAgreeTo(tray(a) - tray(b), { digits: 12 });
    expect(found.value).toAgreeTo(a.value - b.value, { digits: 12 });
    expect(found.u).toBeLessThan(Math.hypot(a.u ?? 0, b.u ?? 0));
    expect(found.hue).toBe('difference');
  });

  test('a mean that the model was fitted to, less its prediction: as the point of the comparison has it', () => {
    const place = { quantity: 'q-r', series: 'series-a', at: { 'q-h': reading('12', 'cm') } };
    const point = findings.comparisons.get('c-upright')?.points.find(({ at }) => at['q-h'] === 0.12);

    const found = scalar(spout, {
      kind: 'difference',
      a: { kind: 'mean', ...place },
      b: { kind: 'prediction', model: 'model-3', ...place },
    });

    expect(found.u).toAgreeTo(point?.difference?.u ?? NaN, { digits: 12 });
  });

  test('centimetres less degrees: cannot be subtracted', () => {
    expect(
      findValue(findings, spout, { kind: 'difference', a: mean, b: { ...mean, quantity: 'q-theta' } }),
    ).toMatchObject({
      code: 'dimension mismatch',
      sentence: 'cm and ° cannot be subtracted. Choose two values of the same kind.',
    });
  });
});

describe('columns of one trial belong together', () => {
  test('law: what is derived from one reading in two ways cancels in every trial', () => {
    fc.assert(
      fc.property(
        fc.array(fc.integer({ min: 1, max: 9999 }), { minLength: 1, maxLength: 12 }),
        (hundredths) => {
          const of = evidence({
            instruments: [ruler('ruler', '0.2', '0.5', 'mm')],
            quantities: [
              recorded('L', 'mm', 'ruler'),
              derived('a', 'mm', '2*{L}'),
              derived('b', 'mm', '{a} - {L} - {L}'),
            ],
            series: [series('A', [], ['L'])],
            trials: hundredths.map((value, i) =>
              trial('A', i + 1, { L: reading((value / 100).toFixed(2), 'mm') }),
            ),
          });

          const b = evaluate(of).values.get('b@A');

          expect(b).toMatchObject({ shape: 'column', shared: [] });
          expect(b?.shape === 'column' && [...b.own].every((u) => u === 0)).toBe(true);
        },
      ),
    );
  });

  test('law: the scale error of one ruler does not average away, however many trials there are', () => {
    fc.assert(
      fc.property(fc.integer({ min: 1, max: 40 }), fc.integer({ min: 1, max: 50 }), (n, permille) => {
        const of = evidence({
          instruments: [
            instrument('ruler', [
              { kind: 'scale', amount: String(permille / 1000), unit: '1', shape: 'normal', shared: true },
            ]),
          ],
          quantities: [recorded('L', 'mm', 'ruler')],
          series: [series('A', [], ['L'])],
          trials: Array.from({ length: n }, (_, i) => trial('A', i + 1, { L: reading('80', 'mm') })),
        });

        expect(scalar(of, { kind: 'mean', quantity: 'L', series: 'A', at: {} }).u).toAgreeTo(
          (0.08 * permille) / 1000,
          { digits: 12 },
        );
      }),
    );
  });
});

describe('scope', () => {
  const of = evidence({
    quantities: [
      recorded('h', 'cm'),
      constant('y', reading('12', 'cm', '0.1')),
      derived('s', 'cm', '{h} + {y}'),
    ],
    series: [
      series('A', ['h'], []),
      series('B', [], [], { h: reading('20', 'cm', '0.2') }),
      series('C', ['h'], [], { y: reading('15', 'cm') }),
    ],
    trials: [
      trial('A', 1, { h: reading('4', 'cm') }),
      trial('C', 1, { h: reading('4', 'cm'), y: reading('16', 'cm') }),
      trial('C', 2, { h: reading('4', 'cm') }),
    ],
  });
  const found = evaluate(of).values;
  const values = (key: string): number[] => {
    const column = found.get(key);
    return column?.shape === 'column' ? [...column.values].map((value) => Number(value.toFixed(12))) : [];
  };

  test('a trial’s own value comes first, then what the series holds, then the constant', () => {
    expect(values('s@A')).toEqual([0.16]);
    expect(found.get('s@B')).toMatchObject({
      shape: 'scalar',
      value: 0.32,
      u: expect.closeTo(Math.hypot(0.001, 0.002), 12),
    });
    expect(values('s@C')).toEqual([0.2, 0.19]);
  });

  test('outside of all series a quantity that trials read has no single value', () => {
    expect(found.get('s')).toMatchObject({ code: 'no single value' });
    expect(found.get('y')).toMatchObject({ shape: 'scalar', value: 0.12 });
  });

  test('groups: equal settings as decimals, in increasing order, exclusions apart', () => {
    const groups = evaluate(spout).groups.get('series-b') ?? [];

    expect(groups.map(({ settings }) => settings['q-theta']?.text)).toEqual([
      '10',
      '20',
      '30',
      '38',
      '45',
      '55',
    ]);
    expect(groups[3]).toMatchObject({
      kept: ['trial-b10', 'trial-b12', 'trial-b13'],
      excluded: ['trial-b11'],
    });
  });
});

describe('keys and readings', () => {
  test('law: the quick way of reading a number gives what the exact way gives', () => {
    const unit = fc.constantFrom('m', 'cm', 'mm', 'µm', 'g', 'kg', 'min', 'h', '°', 'ms', '1', '%', 'km/h');
    const text = fc
      .tuple(fc.integer({ min: -999_999_999, max: 999_999_999 }), fc.integer({ min: 0, max: 6 }))
      .map(([digits, scale]) => (digits / 10 ** scale).toFixed(scale));

    fc.assert(
      fc.property(text, unit, (number, unitText) => {
        const exact = readSi(reading(number, unitText));

        expect(readValue(reading(number, unitText))).toMatchObject({
          ok: true,
          value: exact.ok ? exact.value : NaN,
        });
      }),
      { numRuns: 400 },
    );
  });

  test('a setting written in another way: is the same key', () => {
    const key = (text: string, unit: string): string =>
      keyOf({ kind: 'mean', quantity: 'q', series: 's', at: { h: reading(text, unit) } });

    expect(key('20.0', 'cm')).toBe(key('200', 'mm'));
    expect(key('20.0', 'cm')).not.toBe(key('20.1', 'cm'));
  });

  test('differences: the key tells which is which', () => {
    expect(keyOf({ kind: 'difference', a: mean, b: prediction })).not.toBe(
      keyOf({ kind: 'difference', a: prediction, b: mean }),
    );
  });
});

describe('sources in words', () => {
  test.each([
    ['inst:i-tray:offset', 'ruled tray, zero common to all', true],
    ['const:q-y:own', 'y as it was read', true],
    ['held:series-b:q-h:own', 'h as held in series B', true],
    ['fit:c-upright:0', 'fit of “Upright can”', true],
    ['trial:trial-b12:q-r', 'reading of R in B12', false],
  ] as const)('%s: %s', (id, words, shared) => {
    expect(findSource(findings, spout, id)).toMatchObject({ id, words, shared });
  });

  test('the scatter of a mean: has the degrees of freedom of its trials', () => {
    const source = scalar(spout, mean).parts.find((part) => part.source.startsWith('mean:'))?.source ?? '';

    expect(findSource(findings, spout, source)).toMatchObject({
      words: 'scatter of R',
      kind: 'scatter',
      degreesOfFreedom: 2,
    });
  });

  test('every part of a prediction at a setting: can be told', () => {
    const words = scalar(spout, prediction).parts.map(
      ({ source }) => findSource(findings, spout, source).words,
    );

    expect(words).toContain('setting of θ');
    expect(words.every((text) => !text.includes('gone'))).toBe(true);
  });
});
