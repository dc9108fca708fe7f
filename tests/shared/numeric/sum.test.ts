import fc from 'fast-check';
import { expect, test } from 'vitest';
import { sum } from '#shared/numeric/sum.ts';

test('sum, of ten tenths: is 1 exactly', () => {
  expect(sum(Array.from({ length: 10 }, () => 0.1))).toBe(1);
});

test('sum, of nothing: is 0', () => {
  expect(sum([])).toBe(0);
});

test('sum, with an infinity: is infinite', () => {
  expect(sum([1, Infinity, 2])).toBe(Infinity);
});

test('sum, of infinities of both signs: is NaN', () => {
  expect(sum([Infinity, -Infinity])).toBeNaN();
});

test('order of the terms does not matter beyond the last place', () => {
  const terms = fc.array(fc.double({ min: 0.001, max: 1e12, noNaN: true }), { minLength: 1, maxLength: 40 });
  fc.assert(
    fc.property(terms, (values) => {
      const forwards = sum(values);
      return Math.abs(sum([...values].reverse()) - forwards) <= 2 * Number.EPSILON * forwards;
    }),
  );
});
