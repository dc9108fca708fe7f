import { describe, expect, test } from 'vitest';
import { confidenceBand } from '#shared/fitting/confidence-band.ts';
import { fitLeastSquares } from '#shared/fitting/fit-least-squares.ts';
import { scaleCovariance } from '#shared/fitting/scale-covariance.ts';
import { at } from '#shared/numeric/element.ts';

/*
 * JCGM 100:2008, H.3: calibration of a thermometer, correction b against reading t in °C, line about t₀ = 20 °C.
 * Printed values first; full precision recomputed independently from the same eleven pairs (table H.6).
 */
const READINGS = [21.521, 22.012, 22.512, 23.003, 23.507, 23.999, 24.513, 25.002, 25.503, 26.01, 26.511];
const CORRECTIONS = [-0.171, -0.169, -0.166, -0.159, -0.164, -0.165, -0.156, -0.157, -0.159, -0.161, -0.16];
const ORIGIN = 20;

function calibrate(): {
  parameters: Float64Array;
  covariance: Float64Array;
  scatter: number;
  linear: boolean;
} {
  const outcome = fitLeastSquares({
    observations: READINGS.length,
    parameters: [{ start: 0 }, { start: 0 }],
    residuals: (p, out) =>
      out.set(READINGS.map((t, i) => at(p, 0) + at(p, 1) * (t - ORIGIN) - (CORRECTIONS[i] ?? NaN))),
    jacobian: (_p, columns) => {
      columns[0]?.fill(1);
      columns[1]?.set(READINGS.map((t) => t - ORIGIN));
    },
  });
  if (outcome.status !== 'converged') throw new Error(outcome.status);
  const { parameters, chiSquared, degreesOfFreedom, linear } = outcome;
  const covariance = scaleCovariance(outcome.covariance, chiSquared, degreesOfFreedom);
  if (covariance === null) throw new Error('no degrees of freedom');
  return { parameters, covariance, scatter: Math.sqrt(chiSquared / degreesOfFreedom), linear };
}

describe('calibration line of GUM H.3', () => {
  const { parameters, covariance, scatter, linear } = calibrate();
  const uncertainties = [0, 3].map((index) => Math.sqrt(at(covariance, index)));

  test('is found linear', () => {
    expect(linear).toBe(true);
  });

  test('intercept -0.1712(29) °C', () => {
    expect(parameters[0]).toAgreeTo(-0.17120379, { digits: 8 });
    expect(uncertainties[0]).toAgreeTo(0.002877598, { digits: 7 });
  });

  test('slope 0.00218(67)', () => {
    expect(parameters[1]).toAgreeTo(0.002182698, { digits: 6 });
    expect(uncertainties[1]).toAgreeTo(0.000667939, { digits: 6 });
  });

  test('correlation -0.930, scatter 0.0035 °C', () => {
    const correlation = at(covariance, 1) / Math.sqrt(at(covariance, 0) * at(covariance, 3));

    expect(correlation).toAgreeTo(-0.930429603, { digits: 9 });
    expect(scatter).toAgreeTo(0.003497564, { digits: 7 });
  });

  test('correction at 30 °C: -0.1494(41) °C, the covariance included', () => {
    const predicted = at(parameters, 0) + 10 * at(parameters, 1);
    const u = confidenceBand([Float64Array.of(1), Float64Array.of(10)], covariance)[0];

    expect(Number(predicted.toFixed(4))).toBe(-0.1494);
    expect(Number(u?.toFixed(4))).toBe(0.0041);
  });
});
