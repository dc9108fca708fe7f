import { describe, expect, test } from 'vitest';
import { aicc } from '#shared/fitting/aicc.ts';
import { confidenceBand } from '#shared/fitting/confidence-band.ts';
import { goodnessOfFit } from '#shared/fitting/goodness-of-fit.ts';
import { parameterSensitivity } from '#shared/fitting/parameter-sensitivity.ts';
import { predictionBand } from '#shared/fitting/prediction-band.ts';
import { scaleCovariance } from '#shared/fitting/scale-covariance.ts';
import { at } from '#shared/numeric/element.ts';
import { convergedFit, decay, fitCurve } from './curves.ts';

describe('AICc', () => {
  test('of χ² 6.2 with 2 parameters and 12 observations: adds 4 and 12/9', () => {
    expect(aicc(6.2, 2, 12)).toAgreeTo(6.2 + 4 + 12 / 9, { digits: 14 });
  });

  test('with one observation more than parameters: cannot be corrected', () => {
    expect(aicc(1, 2, 3)).toBeNull();
  });

  test.each([
    ['a negative χ²', -1, 2, 12],
    ['half a parameter', 1, 0.5, 12],
    ['no observation', 1, 0, 0],
  ])('with %s: is refused', (_case, chiSquared, parameters, observations) => {
    expect(() => aicc(chiSquared, parameters, observations)).toThrow(RangeError);
  });
});

describe('goodness of fit', () => {
  test('of χ² 2 ln 20 for two degrees of freedom: p is 0.05', () => {
    expect(goodnessOfFit(2 * Math.log(20), 2).pValue).toAgreeTo(0.05, { digits: 13 });
  });

  test('without degrees of freedom: says nothing', () => {
    expect(goodnessOfFit(0, 0)).toEqual({ pValue: null, reducedChiSquared: null });
  });

  test('of a negative χ²: is refused', () => {
    expect(() => goodnessOfFit(-1, 3)).toThrow(RangeError);
  });
});

describe('covariance for relative weights', () => {
  test('without degrees of freedom: is unknown', () => {
    expect(scaleCovariance(Float64Array.of(1), 0, 0)).toBeNull();
  });

  test('of a negative χ²: is refused', () => {
    expect(() => scaleCovariance(Float64Array.of(1), -1, 2)).toThrow(RangeError);
  });
});

describe('bands', () => {
  // Line through x = 0 … 3 with unit weights: C = [[0.7, −0.3], [−0.3, 0.2]]; u² = 0.7 − 0.6 x + 0.2 x².
  const covariance = Float64Array.of(0.7, -0.3, -0.3, 0.2);
  const derivatives = [Float64Array.of(1, 1, 1), Float64Array.of(0, 1.5, 4)];

  test('confidence band: the correlation of the parameters counts', () => {
    const band = confidenceBand(derivatives, covariance);

    expect([...band]).toEqual([0.7, 0.25, 1.5].map((variance) => expect.closeTo(Math.sqrt(variance), 14)));
  });

  test('prediction band: the reading comes on top in quadrature', () => {
    const band = predictionBand(derivatives, covariance, Float64Array.of(1, 1, 2));

    expect([...band]).toEqual([1.7, 1.25, 5.5].map((variance) => expect.closeTo(Math.sqrt(variance), 14)));
  });

  test('a covariance of the wrong size, or too few sigmas: are refused', () => {
    expect(() => confidenceBand(derivatives, Float64Array.of(1))).toThrow(
      'needs 4 elements of covariance, got 1',
    );
    expect(() => predictionBand(derivatives, covariance, Float64Array.of(1))).toThrow(
      'needs 3 sigmas, got 1',
    );
  });
});

describe('parameter sensitivity', () => {
  const x = [0, 1, 2, 3, 4, 5];

  test('to an offset common to all readings of a decay: agrees with fits of shifted readings', () => {
    const y = x.map((value) => 5 * Math.exp(-0.7 * value));
    const fitShifted = (by: number): Float64Array =>
      convergedFit(fitCurve(decay, { x, y: y.map((value) => value + by) }, [{ start: 4 }, { start: 0.5 }]))
        .parameters;
    const fit = convergedFit(fitCurve(decay, { x, y }, [{ start: 4 }, { start: 0.5 }]));
    const jacobian = decay.derivatives.map((derivative) =>
      Float64Array.from(x, (value) => derivative(fit.parameters, value)),
    );

    const sensitivity = parameterSensitivity(
      jacobian,
      fit.covariance,
      Float64Array.from(x, () => -1),
    );

    const step = 1e-5;
    const [low, high] = [fitShifted(-step), fitShifted(step)];
    expect(sensitivity[0]).toAgreeTo((at(high, 0) - at(low, 0)) / (2 * step), { digits: 6 });
    expect(sensitivity[1]).toAgreeTo((at(high, 1) - at(low, 1)) / (2 * step), { digits: 6 });
  });

  test('with lengths that differ: is refused', () => {
    expect(() =>
      parameterSensitivity([Float64Array.of(1)], Float64Array.of(1, 2), Float64Array.of(1)),
    ).toThrow(RangeError);
    expect(() =>
      parameterSensitivity([Float64Array.of(1)], Float64Array.of(1), Float64Array.of(1, 2)),
    ).toThrow(RangeError);
  });
});
