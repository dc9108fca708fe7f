import { describe, expect, test } from 'vitest';
import { norm } from '#shared/numeric/norm.ts';

describe('norm', () => {
  test.each([
    ['of an ordinary vector', [3, 4], 5],
    ['of numbers whose squares overflow', [3e200, 4e200], 5e200],
    ['of numbers whose squares underflow', [3e-200, 4e-200], 5e-200],
    ['of zeros', [0, 0], 0],
    ['of none', [], 0],
  ])('%s', (_case, vector, length) => {
    expect(norm(Float64Array.from(vector))).toAgreeTo(length, { digits: 15 });
  });

  test('with NaN: is NaN', () => {
    expect(norm(Float64Array.of(1, NaN))).toBeNaN();
  });

  test('with an infinity: is infinite', () => {
    expect(norm(Float64Array.of(1, -Infinity))).toBe(Infinity);
  });

  test('of the tail only', () => {
    expect(norm(Float64Array.of(100, 3, 4), 1)).toBe(5);
  });
});
