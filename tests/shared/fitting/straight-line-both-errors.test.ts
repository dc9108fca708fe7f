import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { straightLineBothErrors } from '#shared/fitting/straight-line-both-errors.ts';

const X = Float64Array.of(0, 1, 2, 3, 4);
const Y = Float64Array.of(1, 3.1, 4.9, 7.2, 8.8);
const ONES = X.map(() => 1);
const ZEROS = X.map(() => 0);

describe('straight line with errors in both', () => {
  test('with exact x and equal errors of y: is the ordinary line with its errors', () => {
    const line = straightLineBothErrors({ x: X, y: Y, xSigmas: ZEROS, ySigmas: ONES });

    // Σ(x − 2)² = 10, Σ(x − 2)(y − 5) = −2·−4 + −1·−1.9 + 0 + 2.2 + 2·3.8.
    expect(line).toMatchObject({
      status: 'converged',
      slope: expect.closeTo(1.97, 13),
      intercept: expect.closeTo(1.06, 13),
      slopeError: expect.closeTo(Math.sqrt(0.1), 13),
      interceptError: expect.closeTo(Math.sqrt(0.2 + 4 / 10), 13),
      covariance: expect.closeTo(-0.2, 13),
      degreesOfFreedom: 3,
    });
  });

  test('with exact y: x and y change their parts', () => {
    const line = straightLineBothErrors({ x: X, y: Y, xSigmas: ONES, ySigmas: ZEROS });
    const mirrored = straightLineBothErrors({ x: Y, y: X, xSigmas: ZEROS, ySigmas: ONES });
    if (line.status !== 'converged' || mirrored.status !== 'converged') throw new Error('no line');

    expect(line.slope).toAgreeTo(1 / mirrored.slope, { digits: 11 });
    expect(line.chiSquared).toAgreeTo(mirrored.chiSquared, { digits: 11 });
  });

  test('points on a line return the line', () => {
    const slope = fc.double({ min: 0.01, max: 100, noNaN: true });
    const sigma = fc.double({ min: 0.1, max: 10, noNaN: true });
    fc.assert(
      fc.property(slope, sigma, sigma, fc.boolean(), (b, xSigma, ySigma, falling) => {
        const signed = falling ? -b : b;
        const line = straightLineBothErrors({
          x: X,
          y: X.map((x) => 3 + signed * x),
          xSigmas: X.map(() => xSigma),
          ySigmas: X.map(() => ySigma),
        });
        return line.status === 'converged' && Math.abs(line.slope / signed - 1) < 1e-10;
      }),
    );
  });

  test('correlated errors: shift the slope, and χ² is that of the correlated weights', () => {
    const points = { x: X, y: Y, xSigmas: ONES, ySigmas: ONES };
    const line = straightLineBothErrors({ ...points, correlations: X.map(() => 0.5) });
    const plain = straightLineBothErrors(points);
    if (line.status !== 'converged' || plain.status !== 'converged') throw new Error('no line');

    const weight = 1 / (1 + line.slope ** 2 - line.slope);
    const chiSquared = X.reduce(
      (total, x, i) => total + weight * ((Y[i] ?? NaN) - line.intercept - line.slope * x) ** 2,
      0,
    );
    expect(line.slope).not.toAgreeTo(plain.slope, { digits: 6 });
    expect(line.chiSquared).toAgreeTo(chiSquared, { digits: 12 });
  });

  test('equal x: not determined', () => {
    expect(straightLineBothErrors({ x: ONES, y: Y, xSigmas: ONES, ySigmas: ONES })).toEqual({
      status: 'not determined',
    });
  });

  test('one point: too few observations', () => {
    const one = Float64Array.of(1);

    expect(straightLineBothErrors({ x: one, y: one, xSigmas: one, ySigmas: one })).toEqual({
      status: 'too few observations',
      observations: 1,
      needed: 2,
    });
  });

  test.each([
    ['lengths that differ', { y: Float64Array.of(1) }, 'needs columns of length 5, got 1, 5, 5, 5'],
    ['no uncertainty at all', { xSigmas: ZEROS, ySigmas: ZEROS }, 'not both 0, got 0 and 0 at 0'],
    ['a negative sigma', { xSigmas: X.map(() => -1) }, 'got -1 and 1 at 0'],
    ['a correlation beyond 1', { correlations: X.map(() => 2) }, 'needs correlations within ±1, got 2 at 0'],
  ])('%s: is refused', (_case, change, message) => {
    const points = { x: X, y: Y, xSigmas: ONES, ySigmas: ONES, ...change };

    expect(() => straightLineBothErrors(points)).toThrow(message);
  });
});
