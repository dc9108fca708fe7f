import { describe, expect, test } from 'vitest';
import {
  fitWithInputUncertainties,
  type InputUncertaintyProblem,
} from '#shared/fitting/fit-with-input-uncertainties.ts';
import { straightLineBothErrors } from '#shared/fitting/straight-line-both-errors.ts';
import { at } from '#shared/numeric/element.ts';

const X = Float64Array.of(0, 1, 2, 3, 4, 5);
const Y = Float64Array.of(1.1, 2.9, 5.2, 6.8, 9.1, 11);

function lineProblem(change: Partial<InputUncertaintyProblem> = {}): InputUncertaintyProblem {
  return {
    observed: Y,
    outputSigmas: X.map(() => 0.1),
    inputSigmas: [X.map(() => 0.2)],
    parameters: [{ start: 0 }, { start: 1 }],
    model: (p, out) => out.set(X.map((x) => at(p, 0) + at(p, 1) * x)),
    jacobian: (_p, columns) => {
      columns[0]?.fill(1);
      columns[1]?.set(X);
    },
    inputSlopes: (p, columns) => columns[0]?.fill(at(p, 1)),
    ...change,
  };
}

describe('fit with input uncertainties', () => {
  test('of a line with equal uncertainties: weighs with the fitted slope and settles', () => {
    const fit = fitWithInputUncertainties(lineProblem());
    if (fit.outcome.status !== 'converged') throw new Error(fit.outcome.status);

    expect(fit.settled).toBe(true);
    expect(fit.sigmas[0]).toAgreeTo(Math.hypot(0.1, 0.2 * at(fit.outcome.parameters, 1)), { digits: 9 });
  });

  test('of a line: lies close to the line that adjusts both coordinates', () => {
    const fit = fitWithInputUncertainties(lineProblem());
    const line = straightLineBothErrors({ x: X, y: Y, xSigmas: X.map(() => 0.2), ySigmas: X.map(() => 0.1) });
    if (fit.outcome.status !== 'converged' || line.status !== 'converged') throw new Error('no fit');

    const away = Math.abs(at(fit.outcome.parameters, 1) - line.slope);
    expect(away).toBeLessThan(0.05 * line.slopeError);
  });

  test('without uncertain inputs: is one plain fit', () => {
    const fit = fitWithInputUncertainties(lineProblem({ inputSigmas: [] }));

    expect(fit).toMatchObject({ rounds: 1, settled: true, outcome: { status: 'converged', linear: true } });
    expect([...fit.sigmas]).toEqual(Array.from(X, () => 0.1));
  });

  test('inputs known exactly: an infinite slope there does no harm', () => {
    const problem = lineProblem({
      inputSigmas: [X.map(() => 0)],
      inputSlopes: (_p, columns) => columns[0]?.fill(Infinity),
    });

    expect(fitWithInputUncertainties(problem).outcome.status).toBe('converged');
  });

  test('a point without any uncertainty: cannot be weighted, and is named', () => {
    const problem = lineProblem({
      outputSigmas: X.map((_, i) => (i === 3 ? 0 : 0.1)),
      inputSigmas: [X.map(() => 0)],
    });

    expect(fitWithInputUncertainties(problem).outcome).toEqual({
      status: 'uncertainty not positive',
      observation: 3,
    });
  });

  test('one point for two parameters: too few observations', () => {
    const one = Float64Array.of(1);
    const problem = lineProblem({
      observed: one,
      outputSigmas: one,
      inputSigmas: [one],
    });

    expect(fitWithInputUncertainties(problem).outcome.status).toBe('too few observations');
  });

  test.each([
    ['lengths that differ', { outputSigmas: Float64Array.of(1) }, 'needs 6 sigmas, got 1'],
    ['a negative sigma', { inputSigmas: [X.map(() => -1)] }, 'needs sigmas that are finite and ≥ 0, got -1'],
    ['a sigma that is not a number', { outputSigmas: X.map(() => NaN) }, 'finite and ≥ 0, got NaN'],
  ])('%s: is refused', (_case, change, message) => {
    expect(() => fitWithInputUncertainties(lineProblem(change))).toThrow(message);
  });
});
