/** Simultaneous resistance and reactance. Source: JCGM 100:2008, H.2 (tables H.2 to H.4). */
import { describe, expect, test } from 'vitest';
import { combineContributions } from '#shared/uncertainty/combine-contributions.ts';
import { correlatedContributions } from '#shared/uncertainty/correlated-contributions.ts';
import { correlation } from '#shared/uncertainty/correlation.ts';
import { meanOfRepeats } from '#shared/uncertainty/mean-of-repeats.ts';
import { standardUncertainty } from '#shared/uncertainty/standard-uncertainty.ts';

const VOLTS = [5.007, 4.994, 5.005, 4.99, 4.999];
const AMPERES = [19.663e-3, 19.639e-3, 19.64e-3, 19.685e-3, 19.678e-3];
const RADIANS = [1.0456, 1.0438, 1.0468, 1.0428, 1.0433];

const readings = [VOLTS, AMPERES, RADIANS];
const means = readings.map((column) => meanOfRepeats(column).mean);

/** Type A covariance of two means: Σ(q − q̄)(r − r̄)/(n(n − 1)). Source: JCGM 100:2008, 5.2.3. */
function covarianceOfMeans(a: readonly number[], b: readonly number[]): number {
  const [meanA, meanB] = [meanOfRepeats(a).mean, meanOfRepeats(b).mean];
  const products = a.map((value, i) => (value - meanA) * ((b[i] ?? NaN) - meanB));
  return products.reduce((sum, product) => sum + product, 0) / (a.length * (a.length - 1));
}

const matrix = Float64Array.from(readings.flatMap((a) => readings.map((b) => covarianceOfMeans(a, b))));
const [v = NaN, i = NaN, phi = NaN] = means;
const [ofV = [], ofI = [], ofPhi = []] =
  correlatedContributions(matrix, (column) => `scatter ${column}`) ?? [];

function result(byV: number, byI: number, byPhi: number) {
  return combineContributions([
    { derivative: byV, contributions: ofV },
    { derivative: byI, contributions: ofI },
    { derivative: byPhi, contributions: ofPhi },
  ]);
}
const [resistance, reactance, impedance] = [(v / i) * Math.cos(phi), (v / i) * Math.sin(phi), v / i];
const ofResistance = result(resistance / v, -resistance / i, -reactance);
const ofReactance = result(reactance / v, -reactance / i, resistance);
const ofImpedance = result(impedance / v, -impedance / i, 0);

describe('GUM H.2, resistance and reactance from simultaneous readings', () => {
  test('correlations of the means are −0.36, 0.86 and −0.65', () => {
    expect(correlation(ofV, ofI)).toAgreeTo(-0.3553112, { digits: 6 });
    expect(correlation(ofV, ofPhi)).toAgreeTo(0.8576242, { digits: 6 });
    expect(correlation(ofI, ofPhi)).toAgreeTo(-0.6451112, { digits: 6 });
  });

  test.each([
    ['R', resistance, 127.732, ofResistance, 0.071071407],
    ['X', reactance, 219.847, ofReactance, 0.295581677],
    ['Z', impedance, 254.26, ofImpedance, 0.23633613],
  ])('%s and its standard uncertainty', (_symbol, value, expected, contributions, u) => {
    expect(value).toBeCloseTo(expected, 3);
    expect(standardUncertainty(contributions)).toAgreeTo(u, { digits: 7 });
  });

  test('correlations of the results are −0.588, −0.485 and 0.993', () => {
    expect(correlation(ofResistance, ofReactance)).toBeCloseTo(-0.588, 3);
    expect(correlation(ofResistance, ofImpedance)).toBeCloseTo(-0.485, 3);
    expect(correlation(ofReactance, ofImpedance)).toBeCloseTo(0.993, 3);
  });
});
