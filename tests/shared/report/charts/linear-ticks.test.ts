import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { linearTicks, tickText } from '#shared/report/charts/linear-ticks.ts';
import { placeLabel } from '#shared/report/charts/label-placer.ts';

describe('linearTicks', () => {
  test('law: ticks lie inside, evenly, at multiples of a round step', () => {
    fc.assert(
      fc.property(
        fc.double({ min: -1e6, max: 1e6, noNaN: true }),
        fc.double({ min: 1e-3, max: 1e6, noNaN: true }),
        fc.integer({ min: 2, max: 8 }),
        (min, span, count) => {
          const { step, values } = linearTicks(min, min + span, count);

          const lead = step / 10 ** Math.floor(Math.log10(step) + 1e-9);
          expect([1, 2, 5, 10].some((one) => Math.abs(one - lead) < 1e-6)).toBe(true);
          expect(values.length).toBeGreaterThan(0);
          expect(
            values.every((value) => value >= min - step * 1e-6 && value <= min + span + step * 1e-6),
          ).toBe(true);
        },
      ),
      { seed: 3 },
    );
  });

  test('an empty range, when asked: is a mistake of the caller', () => {
    expect(() => linearTicks(1, 1, 5)).toThrow(
      'linearTicks: needs min < max and a count above 0, got 1, 1, 5',
    );
  });
});

describe('tickText', () => {
  test.each([
    [0, 0.5, '0.0'],
    [-1.5, 0.5, '−1.5'],
    [30, 5, '30'],
    [0.07, 0.01, '0.07'],
    [2_000_000, 1_000_000, '2·10^6'],
  ])('%d at steps of %d, when written: is %s', (value, step, text) => {
    expect(tickText(value, step)).toBe(text);
  });
});

describe('placeLabel', () => {
  const bounds = { left: 0, top: 0, right: 100, bottom: 100 };
  const at = (left: number) => ({ box: { left, top: 0, right: left + 10, bottom: 10 }, cost: 0 });

  test('a place that is taken, when another is free: is left', () => {
    expect(placeLabel([at(0), at(50)], [{ left: 0, top: 0, right: 20, bottom: 20 }], bounds)).toEqual(
      at(50).box,
    );
  });

  test('no free place, when asked: is none, so that labels never run over points', () => {
    expect(placeLabel([at(0), at(95)], [{ left: 0, top: 0, right: 20, bottom: 20 }], bounds)).toBeNull();
  });
});
