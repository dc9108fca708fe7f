import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { mean } from '#shared/statistics/mean.ts';
import { pooledStdDev } from '#shared/statistics/pooled-std-dev.ts';
import { sampleStdDev } from '#shared/statistics/sample-std-dev.ts';

/** Readings as instruments give them: whole steps of 0.01, so that shifts stay exact enough to compare. */
const readings = fc.array(
  fc.integer({ min: -5000, max: 5000 }).map((step) => step / 100),
  {
    minLength: 2,
    maxLength: 30,
  },
);
const shift = fc.integer({ min: -1000, max: 1000 });
const scale = fc.double({ min: 0.01, max: 100, noNaN: true });

const close = (a: number, b: number, size: number): boolean => Math.abs(a - b) <= 1e-12 * (1 + size);

describe('laws of mean and scatter', () => {
  test('a shift moves the mean and leaves the scatter', () => {
    fc.assert(
      fc.property(readings, shift, (values, by) => {
        const moved = values.map((value) => value + by);
        return (
          close(mean(moved), mean(values) + by, 1000) &&
          close(sampleStdDev(moved) ?? NaN, sampleStdDev(values) ?? NaN, 1000)
        );
      }),
    );
  });

  test('a change of unit commutes with both', () => {
    fc.assert(
      fc.property(readings, scale, (values, factor) => {
        const scaled = values.map((value) => value * factor);
        return (
          close(mean(scaled), mean(values) * factor, 50 * factor) &&
          close(sampleStdDev(scaled) ?? NaN, (sampleStdDev(values) ?? NaN) * factor, 50 * factor)
        );
      }),
    );
  });

  test('the order of the readings does not matter', () => {
    fc.assert(fc.property(readings, (values) => close(mean([...values].reverse()), mean(values), 50)));
  });

  test('equal readings do not scatter', () => {
    fc.assert(fc.property(shift, (value) => sampleStdDev([value, value, value]) === 0));
  });

  test('one group alone is pooled to its own scatter', () => {
    fc.assert(
      fc.property(readings, (values) =>
        close(pooledStdDev([values])?.value ?? NaN, sampleStdDev(values) ?? NaN, 50),
      ),
    );
  });
});

describe('mean', () => {
  test('of no reading: is refused', () => {
    expect(() => mean([])).toThrow('mean: needs at least 1 value, got 0');
  });
});

describe('sample standard deviation', () => {
  test('of one reading: is unknown, not zero', () => {
    expect(sampleStdDev([4])).toBeNull();
  });

  // JCGM 100:2008, H.2, table H.2: five voltages, mean 4.9990 V with u = s/√5 = 0.0032 V.
  test('of the voltages of GUM H.2: gives the printed u of the mean', () => {
    const voltages = [5.007, 4.994, 5.005, 4.99, 4.999];

    expect(mean(voltages)).toAgreeTo(4.999, { digits: 14 });
    expect(Number(((sampleStdDev(voltages) ?? NaN) / Math.sqrt(5)).toFixed(4))).toBe(0.0032);
  });
});

describe('pooled standard deviation', () => {
  test('of groups with 2 and 3 readings: weighs the variances by their degrees of freedom', () => {
    // Variances 2 (1 degree of freedom) and 4 (2 degrees): (2 + 8)/3.
    expect(pooledStdDev([[1, 3], [4, 6, 8], [5]])).toEqual({
      value: expect.closeTo(Math.sqrt(10 / 3), 14),
      degreesOfFreedom: 3,
    });
  });

  test('of single readings only: is unknown', () => {
    expect(pooledStdDev([[1], [2], []])).toBeNull();
  });
});
