import { describe, expect, test } from 'vitest';
import { coverageFactor } from '#shared/statistics/coverage-factor.ts';
import { effectiveDegreesOfFreedom } from '#shared/statistics/effective-degrees-of-freedom.ts';

describe('coverage factor', () => {
  test.each([
    ['a level of 0', 0, 5],
    ['a level of 1', 1, 5],
    ['a level that is not a number', NaN, 5],
    ['no degree of freedom', 0.95, 0],
  ])('for %s: is refused', (_case, level, degreesOfFreedom) => {
    expect(() => coverageFactor(level, degreesOfFreedom)).toThrow(RangeError);
  });
});

describe('effective degrees of freedom', () => {
  test('of one component: are its own', () => {
    expect(effectiveDegreesOfFreedom([{ contribution: 1e-90, degreesOfFreedom: 4 }])).toBe(4);
  });

  test('when no component is limited, or none is there: are infinite', () => {
    expect(effectiveDegreesOfFreedom([{ contribution: 2, degreesOfFreedom: Infinity }])).toBe(Infinity);
    expect(effectiveDegreesOfFreedom([])).toBe(Infinity);
  });

  test('with a component that has none: is refused', () => {
    expect(() => effectiveDegreesOfFreedom([{ contribution: 1, degreesOfFreedom: 0 }])).toThrow(RangeError);
  });
});
