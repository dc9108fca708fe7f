import { describe, expect, test } from 'vitest';
import { at } from '#shared/numeric/element.ts';
import { convergedFit, decay, fitCurve, line, type Curve } from './curves.ts';

const X = [0, 1, 2, 3, 4, 5];
const STARTS = [{ start: 1 }, { start: 1 }];

describe('fit of a straight line', () => {
  // Normal equations by hand: n = 6, Σx = 15, Σx² = 55, determinant 105.
  const y = [1, 3, 4, 8, 9, 11];
  const fit = convergedFit(fitCurve(line, { x: X, y }, STARTS));

  test('is found linear and solved at once', () => {
    expect(fit.linear).toBe(true);
    expect(fit.iterations).toBe(1);
  });

  test('has the parameters of the normal equations', () => {
    expect(fit.parameters[0]).toAgreeTo((36 * 55 - 15 * 126) / 105, { digits: 14 });
    expect(fit.parameters[1]).toAgreeTo((6 * 126 - 15 * 36) / 105, { digits: 14 });
  });

  test('has the covariance of unit weights', () => {
    expect([...fit.covariance]).toEqual([55, -15, -15, 6].map((value) => expect.closeTo(value / 105, 14)));
  });

  test('has four degrees of freedom and no parameter on a bound', () => {
    expect(fit.degreesOfFreedom).toBe(4);
    expect(fit.atBound).toEqual([false, false]);
  });
});

describe('fit of a decay', () => {
  test('without noise, from a far start: gives the parameters back', () => {
    const y = X.map((x) => 5 * Math.exp(-0.7 * x));

    const fit = convergedFit(fitCurve(decay, { x: X, y }, [{ start: 0.5 }, { start: 3 }]));

    expect(fit.linear).toBe(false);
    expect(fit.parameters[0]).toAgreeTo(5, { digits: 12 });
    expect(fit.parameters[1]).toAgreeTo(0.7, { digits: 12 });
  });

  test('started at the solution: is not taken for linear', () => {
    const y = X.map((x) => 5 * Math.exp(-0.7 * x));

    const fit = convergedFit(fitCurve(decay, { x: X, y }, [{ start: 5 }, { start: 0.7 }]));

    expect(fit.linear).toBe(false);
    expect(fit.chiSquared).toBe(0);
  });

  test('with as many points as parameters: goes through them, no degree of freedom left', () => {
    const fit = convergedFit(fitCurve(decay, { x: [0, 1], y: [4, 1] }, [{ start: 1 }, { start: 1 }]));

    expect(fit.parameters[1]).toAgreeTo(Math.log(4), { digits: 12 });
    expect(fit.degreesOfFreedom).toBe(0);
  });
});

describe('bounds', () => {
  const y = [2, 1, 0, -1, -2, -3];

  test('a line whose slope may not fall below 0: stays on the bound and says so', () => {
    const fit = convergedFit(fitCurve(line, { x: X, y }, [{ start: 1 }, { start: 1, min: 0 }]));

    expect(fit.parameters[1]).toBe(0);
    expect(fit.parameters[0]).toAgreeTo(-0.5, { digits: 12 });
    expect(fit.atBound).toEqual([false, true]);
  });

  test('a bound that the solution does not reach: changes nothing', () => {
    const points = { x: X, y };

    const free = convergedFit(fitCurve(line, points, STARTS));
    const bounded = convergedFit(fitCurve(line, points, [{ start: 1 }, { start: 1, min: -10, max: 10 }]));

    expect([...bounded.parameters]).toEqual([...free.parameters]);
    expect(bounded.atBound).toEqual([false, false]);
  });

  test('a decay confined from above: the other parameter is the best one on the bound', () => {
    const points = { x: X, y: X.map((x) => 5 * Math.exp(-0.7 * x)) };

    const fit = convergedFit(fitCurve(decay, points, [{ start: 1 }, { start: 0.1, max: 0.5 }]));

    // With the rate held at ½ the amplitude is linear: Σ y e / Σ e² with e = exp(−x/2).
    const shape = X.map((x) => Math.exp(-0.5 * x));
    const best =
      shape.reduce((t, e, i) => t + e * (points.y[i] ?? NaN), 0) / shape.reduce((t, e) => t + e * e, 0);
    expect(fit.parameters[1]).toBe(0.5);
    expect(fit.parameters[0]).toAgreeTo(best, { digits: 11 });
    expect(fit.atBound).toEqual([false, true]);
  });

  test('a start on the bound with the solution inside: leaves the bound', () => {
    const points = { x: X, y: X.map((x) => 5 * Math.exp(-0.7 * x)) };

    const fit = convergedFit(
      fitCurve(decay, points, [
        { start: 1, min: 0 },
        { start: 0, min: 0 },
      ]),
    );

    expect(fit.parameters[1]).toAgreeTo(0.7, { digits: 12 });
    expect(fit.atBound).toEqual([false, false]);
  });

  test('both parameters pressed on their bounds: converges in the corner', () => {
    const fit = convergedFit(
      fitCurve(line, { x: X, y }, [
        { start: 5, min: 4 },
        { start: 2, min: 1 },
      ]),
    );

    expect([...fit.parameters]).toEqual([4, 1]);
    expect(fit.atBound).toEqual([true, true]);
  });
});

describe('residuals far larger than their uncertainties', () => {
  const shiftedDecay: Curve = {
    value: (p, x) => decay.value(p, x) + at(p, 2),
    derivatives: [...decay.derivatives, () => 1],
  };

  test('where undamped steps would lead away from the minimum: the search keeps its own end', () => {
    const y = [10.6588, 6.889, 4.6049, 3.1914, 2.2279, 1.9207, 1.4423, 1.2476, 1.0416];
    const points = { x: y.map((_, i) => 0.6 * i), y, sigmas: y.map(() => 0.1) };

    const fit = convergedFit(
      fitCurve(shiftedDecay, points, [
        { start: -0.9184, min: -1.071, max: 0.002668 },
        { start: 3.6368, min: 0.05, max: 3.7146 },
        { start: 1.7962, min: 0.7588, max: 4.4843 },
      ]),
    );

    // Zero of dχ²/d(rate) with the amplitude on its bound and the offset at its best, found with mpmath.
    expect(fit.atBound).toEqual([true, false, false]);
    expect(fit.parameters[1]).toAgreeTo(0.944698324526, { digits: 5 });
  });
});

describe('what the data do not determine', () => {
  const sumOfTwo: Curve = {
    value: (p, x) => (at(p, 0) + at(p, 1)) * x + at(p, 2),
    derivatives: [(_p, x) => x, (_p, x) => x, () => 1],
  };

  test('two parameters that only act as their sum: not determined, both named', () => {
    const outcome = fitCurve(sumOfTwo, { x: X, y: [1, 3, 4, 8, 9, 11] }, [...STARTS, { start: 0 }]);

    expect(outcome).toMatchObject({ status: 'not determined', rank: 2, undetermined: [0, 1] });
  });

  test('a parameter without any effect: not determined', () => {
    const idle: Curve = { value: (p) => at(p, 0), derivatives: [() => 1, () => 0] };

    expect(fitCurve(idle, { x: X, y: X }, STARTS)).toMatchObject({
      status: 'not determined',
      undetermined: [1],
    });
  });

  test('a line through points at one x: not determined', () => {
    expect(fitCurve(line, { x: [2, 2, 2], y: [1, 2, 3] }, STARTS)).toMatchObject({
      status: 'not determined',
      undetermined: [0, 1],
    });
  });

  test('ten thousand points with two equal columns: not determined', () => {
    const x = Array.from({ length: 10_000 }, (_, i) => Math.sin(i) * 3);
    const y = x.map((value) => 2 * value + 1);

    expect(fitCurve(sumOfTwo, { x, y }, [...STARTS, { start: 0 }]).status).toBe('not determined');
  });

  test('one point for two parameters: too few observations', () => {
    expect(fitCurve(line, { x: [1], y: [2] }, STARTS)).toEqual({
      status: 'too few observations',
      observations: 1,
      needed: 2,
    });
  });
});

describe('what is not finite', () => {
  const root: Curve = {
    value: (p, x) => Math.sqrt(x - at(p, 0)),
    derivatives: [(p, x) => -0.5 / Math.sqrt(x - at(p, 0))],
  };

  test('a residual at the start: named with its observation', () => {
    expect(fitCurve(root, { x: [4, 1, 9], y: [1, 1, 2] }, [{ start: 2 }])).toMatchObject({
      status: 'not finite',
      where: 'start',
      what: 'residual',
      observation: 1,
    });
  });

  test('a derivative at the start: named with its observation', () => {
    expect(fitCurve(root, { x: [4, 9, 1], y: [1, 2, 0] }, [{ start: 1 }])).toMatchObject({
      status: 'not finite',
      where: 'start',
      what: 'derivative',
      observation: 2,
    });
  });

  test('values beyond a wall on the way: are kept away from', () => {
    const y = [1, 2, 3, 4].map((x) => Math.sqrt(x - 0.9));

    const fit = convergedFit(fitCurve(root, { x: [1, 2, 3, 4], y }, [{ start: -30 }]));

    expect(fit.parameters[0]).toAgreeTo(0.9, { digits: 12 });
  });
});

describe('search that is cut short', () => {
  test('with too few evaluations allowed: not converged, no covariance', () => {
    const points = { x: X, y: X.map((x) => 5 * Math.exp(-0.7 * x)) };

    const outcome = fitCurve(decay, points, [{ start: 0.5 }, { start: 3 }], { maxEvaluations: 4 });

    expect(outcome.status).toBe('not converged');
    expect(outcome).not.toHaveProperty('covariance');
  });
});

describe('mistakes of the caller', () => {
  const points = { x: X, y: X };

  test.each([
    ['no parameter', [], {}, 'fitLeastSquares: needs at least 1 parameter, got 0'],
    ['a start that is not finite', [{ start: NaN }], {}, 'needs finite starts, got NaN for parameter 0'],
    [
      'bounds the wrong way round',
      [{ start: 1, min: 2, max: 1 }],
      {},
      'needs min < max, got 2 and 1 for parameter 0',
    ],
    ['a start outside its bounds', [{ start: 1, min: 2 }], {}, 'needs a start within 2 and Infinity, got 1'],
    ['no evaluation allowed', [{ start: 1 }], { maxEvaluations: 0 }, 'needs maxEvaluations ≥ 1, got 0'],
  ])('%s: is refused', (_case, parameters, options, message) => {
    expect(() => fitCurve(line, points, parameters, options)).toThrow(message);
  });

  test('no observation: is refused', () => {
    expect(() => fitCurve(line, { x: [], y: [] }, STARTS)).toThrow('needs at least 1 observation, got 0');
  });
});
