import fc from 'fast-check';
import { describe, test } from 'vitest';
import { at, item } from '#shared/numeric/element.ts';
import { convergedFit, decay, fitCurve, line } from './curves.ts';

const X = [0, 0.5, 1, 1.5, 2, 3, 4, 6];
const noise = fc.array(
  fc.integer({ min: -100, max: 100 }).map((step) => step / 1000),
  {
    minLength: X.length,
    maxLength: X.length,
  },
);
const amplitude = fc.double({ min: 0.5, max: 20, noNaN: true });
const rate = fc.double({ min: 0.1, max: 1.5, noNaN: true });
const factor = fc.double({ min: 0.001, max: 1000, noNaN: true });
const shift = fc.integer({ min: -50, max: 50 });

const close = (a: number, b: number, tolerance: number): boolean =>
  Math.abs(a - b) <= tolerance * Math.max(1e-3, Math.abs(a), Math.abs(b));

const START = [{ start: 3 }, { start: 0.5 }];
const SIGMAS = X.map(() => 0.1);

function decayPoints(
  a: number,
  k: number,
  errors: readonly number[],
): { x: number[]; y: number[]; sigmas: number[] } {
  return { x: X, y: X.map((x, i) => a * Math.exp(-k * x) + item(errors, i) * a * 0.2), sigmas: SIGMAS };
}

describe('laws of fitting', () => {
  test('noiseless data return the parameters', () => {
    fc.assert(
      fc.property(amplitude, rate, (a, k) => {
        const y = X.map((x) => a * Math.exp(-k * x));
        const { parameters } = convergedFit(fitCurve(decay, { x: X, y }, START));
        return close(at(parameters, 0), a, 1e-9) && close(at(parameters, 1), k, 1e-9);
      }),
    );
  });

  test('a shift of the readings shifts the intercept and nothing else', () => {
    fc.assert(
      fc.property(noise, shift, (errors, by) => {
        const y = X.map((x, i) => 2 + 3 * x + item(errors, i));
        const before = convergedFit(fitCurve(line, { x: X, y }, START));
        const after = convergedFit(fitCurve(line, { x: X, y: y.map((value) => value + by) }, START));
        return (
          Math.abs(at(after.parameters, 0) - at(before.parameters, 0) - by) < 1e-11 &&
          Math.abs(at(after.parameters, 1) - at(before.parameters, 1)) < 1e-11 &&
          Math.abs(after.chiSquared - before.chiSquared) < 1e-10
        );
      }),
    );
  });

  test('the order of the rows does not matter', () => {
    fc.assert(
      fc.property(amplitude, rate, noise, (a, k, errors) => {
        const points = decayPoints(a, k, errors);
        const before = convergedFit(fitCurve(decay, points, START));
        const reversed = { x: [...points.x].reverse(), y: [...points.y].reverse(), sigmas: points.sigmas };
        const after = convergedFit(fitCurve(decay, reversed, START));
        return before.parameters.every((value, j) => close(value, at(after.parameters, j), 1e-9));
      }),
    );
  });

  test('a change of unit commutes with fitting', () => {
    fc.assert(
      fc.property(amplitude, rate, noise, factor, (a, k, errors, unit) => {
        const points = decayPoints(a, k, errors);
        const before = convergedFit(fitCurve(decay, points, START));
        const scaled = {
          x: points.x,
          y: points.y.map((value) => value * unit),
          sigmas: points.sigmas.map((value) => value * unit),
        };
        const after = convergedFit(fitCurve(decay, scaled, [{ start: 3 * unit }, { start: 0.5 }]));
        return (
          close(at(after.parameters, 0), at(before.parameters, 0) * unit, 1e-8) &&
          close(at(after.parameters, 1), at(before.parameters, 1), 1e-8) &&
          close(at(after.standardErrors, 0), at(before.standardErrors, 0) * unit, 1e-7) &&
          close(after.chiSquared, before.chiSquared, 1e-8)
        );
      }),
    );
  });

  test('twice as large uncertainties: the same parameters with twice the error, a quarter of χ²', () => {
    fc.assert(
      fc.property(amplitude, rate, noise, (a, k, errors) => {
        const points = decayPoints(a, k, errors);
        const before = convergedFit(fitCurve(decay, points, START));
        const after = convergedFit(
          fitCurve(decay, { ...points, sigmas: SIGMAS.map((sigma) => 2 * sigma) }, START),
        );
        return (
          close(at(after.parameters, 1), at(before.parameters, 1), 1e-9) &&
          close(at(after.standardErrors, 1), 2 * at(before.standardErrors, 1), 1e-8) &&
          close(after.chiSquared * 4, before.chiSquared, 1e-9)
        );
      }),
    );
  });

  test('no neighbour inside the bounds fits better', () => {
    const top = fc.double({ min: 0.2, max: 3, noNaN: true });
    fc.assert(
      fc.property(amplitude, rate, noise, top, (a, k, errors, max) => {
        const points = decayPoints(a, k, errors);
        const bounded = [
          { start: 1, min: 0, max: 10 },
          { start: max / 2, min: 0, max },
        ];
        const fit = convergedFit(fitCurve(decay, points, bounded));
        const chiSquaredAt = (p: readonly number[]): number =>
          X.reduce(
            (total, x, i) => total + ((decay.value(Float64Array.from(p), x) - item(points.y, i)) / 0.1) ** 2,
            0,
          );
        const steps = [-1e-4, 0, 1e-4];
        const neighbours = steps.flatMap((da) =>
          steps.map((dk) => [at(fit.parameters, 0) + da, at(fit.parameters, 1) + dk]),
        );
        const inside = neighbours.filter((p) =>
          p.every((value, j) => value >= 0 && value <= item(bounded, j).max),
        );
        return inside.every((p) => chiSquaredAt(p) >= fit.chiSquared * (1 - 1e-9) - 1e-9);
      }),
    );
  });
});
