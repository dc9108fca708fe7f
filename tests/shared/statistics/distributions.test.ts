import { describe, expect, test } from 'vitest';
import { chiSquaredCdf } from '#shared/statistics/chi-squared-cdf.ts';
import { chiSquaredQuantile } from '#shared/statistics/chi-squared-quantile.ts';
import { chiSquaredUpperTail } from '#shared/statistics/chi-squared-upper-tail.ts';
import { fCdf } from '#shared/statistics/f-cdf.ts';
import { fQuantile } from '#shared/statistics/f-quantile.ts';
import { fUpperTail } from '#shared/statistics/f-upper-tail.ts';
import { logGamma } from '#shared/statistics/log-gamma.ts';
import { normalCdf } from '#shared/statistics/normal-cdf.ts';
import { normalQuantile } from '#shared/statistics/normal-quantile.ts';
import { normalUpperTail } from '#shared/statistics/normal-upper-tail.ts';
import { stirlingError } from '#shared/statistics/stirling-error.ts';
import { studentCdf } from '#shared/statistics/student-cdf.ts';
import { studentQuantile } from '#shared/statistics/student-quantile.ts';
import { studentUpperTail } from '#shared/statistics/student-upper-tail.ts';
import tails from '#tests/fixtures/distributions/tails.json';
import values from '#tests/fixtures/distributions/values.json';

type Reference = [name: string, args: number[], value: string];

const FUNCTIONS: Record<string, (...args: number[]) => number> = {
  chiSquaredCdf,
  chiSquaredQuantile: (p = NaN, dof = NaN) => chiSquaredQuantile(p, dof),
  chiSquaredUpperTail,
  fCdf,
  fQuantile: (p = NaN, dof1 = NaN, dof2 = NaN) => fQuantile(p, dof1, dof2),
  fUpperTail,
  logGamma,
  normalCdf,
  normalQuantile,
  normalUpperTail,
  stirlingError,
  studentCdf,
  studentQuantile,
  studentUpperTail,
};

// mpmath 1.3, 40 digits and more: see tests/fixtures/distributions/README.md.
describe('distributions, at the reference arguments, agree with 40-digit values to 12 digits', () => {
  test.each([...values, ...tails] as unknown as Reference[])('%s(%j) = %s', (name, args, value) => {
    const computed = FUNCTIONS[name]?.(...args);

    expect(computed).toAgreeTo(Number(value), { digits: 12 });
  });
});

describe('distributions, outside their domain, give NaN', () => {
  test.each([
    ['normalCdf(NaN)', normalCdf(NaN)],
    ['normalUpperTail(NaN)', normalUpperTail(NaN)],
    ['normalQuantile(-0.1)', normalQuantile(-0.1)],
    ['normalQuantile(1.1)', normalQuantile(1.1)],
    ['normalQuantile(NaN)', normalQuantile(NaN)],
    ['studentCdf(1, 0)', studentCdf(1, 0)],
    ['studentCdf(NaN, 4)', studentCdf(NaN, 4)],
    ['studentUpperTail(1, -2)', studentUpperTail(1, -2)],
    ['studentQuantile(0.9, 0)', studentQuantile(0.9, 0)],
    ['studentQuantile(2, 5)', studentQuantile(2, 5)],
    ['chiSquaredCdf(1, 0)', chiSquaredCdf(1, 0)],
    ['chiSquaredCdf(NaN, 3)', chiSquaredCdf(NaN, 3)],
    ['chiSquaredUpperTail(1, -1)', chiSquaredUpperTail(1, -1)],
    ['chiSquaredQuantile(-1, 3)', chiSquaredQuantile(-1, 3)],
    ['fCdf(1, 0, 3)', fCdf(1, 0, 3)],
    ['fUpperTail(1, 3, -1)', fUpperTail(1, 3, -1)],
    ['fQuantile(0.5, 3, 0)', fQuantile(0.5, 3, 0)],
    ['logGamma(-1)', logGamma(-1)],
  ])('%s', (_call, value) => {
    expect(value).toBeNaN();
  });
});

describe('distributions, at the ends of their domain, give the limits', () => {
  test.each([
    ['normalCdf(-Infinity)', normalCdf(-Infinity), 0],
    ['normalCdf(Infinity)', normalCdf(Infinity), 1],
    ['normalQuantile(0)', normalQuantile(0), -Infinity],
    ['normalQuantile(1)', normalQuantile(1), Infinity],
    ['studentCdf(-Infinity, 3)', studentCdf(-Infinity, 3), 0],
    ['studentUpperTail(-Infinity, 3)', studentUpperTail(-Infinity, 3), 1],
    ['studentQuantile(0, 3)', studentQuantile(0, 3), -Infinity],
    ['studentQuantile(1, 3)', studentQuantile(1, 3), Infinity],
    ['studentQuantile(0.5, 3)', studentQuantile(0.5, 3), 0],
    ['chiSquaredCdf(-1, 3)', chiSquaredCdf(-1, 3), 0],
    ['chiSquaredUpperTail(-1, 3)', chiSquaredUpperTail(-1, 3), 1],
    ['chiSquaredUpperTail(Infinity, 3)', chiSquaredUpperTail(Infinity, 3), 0],
    ['chiSquaredQuantile(0, 3)', chiSquaredQuantile(0, 3), 0],
    ['chiSquaredQuantile(1, 3)', chiSquaredQuantile(1, 3), Infinity],
    ['fCdf(0, 3, 4)', fCdf(0, 3, 4), 0],
    ['fUpperTail(Infinity, 3, 4)', fUpperTail(Infinity, 3, 4), 0],
    ['fQuantile(1, 3, 4)', fQuantile(1, 3, 4), Infinity],
    ['logGamma(0)', logGamma(0), Infinity],
    ['logGamma(1)', Math.abs(logGamma(1)) < 1e-14 ? 0 : 1, 0],
  ])('%s', (_call, value, limit) => {
    expect(value).toBe(limit);
  });
});

describe('distributions, with infinite degrees of freedom, are the normal and chi-squared ones', () => {
  test.each([
    ['studentUpperTail', studentUpperTail(2.5, Infinity), normalUpperTail(2.5)],
    ['studentQuantile', studentQuantile(0.975, Infinity), normalQuantile(0.975)],
    ['fUpperTail', fUpperTail(2, 3, Infinity), chiSquaredUpperTail(6, 3)],
    ['fQuantile', fQuantile(0.95, 3, Infinity), chiSquaredQuantile(0.95, 3) / 3],
  ])('%s', (_name, value, limit) => {
    expect(value).toAgreeTo(limit, { digits: 14 });
  });
});

test('chi-squared quantile, given the upper tail itself, keeps its digits where 1 − p has none left', () => {
  // Exponential distribution: P(X > x) = exp(−x/2) for two degrees of freedom.
  const quantile = chiSquaredQuantile(1, 2, 1e-40);

  expect(quantile).toAgreeTo(80 * Math.LN10, { digits: 13 });
});
