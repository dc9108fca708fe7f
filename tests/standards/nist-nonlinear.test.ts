import { describe, expect, test } from 'vitest';
import { fitLeastSquares } from '#shared/fitting/fit-least-squares.ts';
import type { FitOutcome } from '#shared/fitting/fit-outcome.ts';
import { scaleCovariance } from '#shared/fitting/scale-covariance.ts';
import { item } from '#shared/numeric/element.ts';
import bennett5 from '#tests/fixtures/nist/bennett5.json';
import boxbod from '#tests/fixtures/nist/boxbod.json';
import eckerle4 from '#tests/fixtures/nist/eckerle4.json';
import hahn1 from '#tests/fixtures/nist/hahn1.json';
import mgh09 from '#tests/fixtures/nist/mgh09.json';
import mgh10 from '#tests/fixtures/nist/mgh10.json';
import misra1a from '#tests/fixtures/nist/misra1a.json';
import rat43 from '#tests/fixtures/nist/rat43.json';
import thurber from '#tests/fixtures/nist/thurber.json';
import { NIST_MODELS } from './nist-models.ts';

// Source: NIST/ITL Statistical Reference Datasets; see tests/fixtures/nist/README.md.
const SETS = [misra1a, hahn1, rat43, mgh09, thurber, boxbod, eckerle4, mgh10, bennett5];

function fit(set: (typeof SETS)[number], start: 0 | 1): FitOutcome {
  const model = NIST_MODELS[set.name];
  if (model === undefined) throw new Error(`no model for ${set.name}`);
  const x = set.rows.map((row) => Number(row[0]));
  const y = set.rows.map((row) => Number(row[1]));
  return fitLeastSquares({
    observations: x.length,
    parameters: item(set.starts, start).map((value) => ({ start: Number(value) })),
    residuals: (b, out) => out.set(x.map((value, i) => model(b, value).value - item(y, i))),
    jacobian: (b, columns) =>
      columns.forEach((column, j) => column.set(x.map((value) => item(model(b, value).derivatives, j)))),
  });
}

const CASES = SETS.flatMap((set) => [
  { name: set.name, level: set.level, from: 'first', start: 0 as const, set },
  { name: set.name, level: set.level, from: 'second', start: 1 as const, set },
]);

describe.each(CASES)('NIST $name ($level), from its $from start', ({ set, start }) => {
  const outcome = fit(set, start);

  test('converges', () => {
    expect(outcome.status).toBe('converged');
  });

  test.each(set.parameters.map((value, j) => [j + 1, value] as const))(
    'b%i = %s to 9 digits',
    (number, certified) => {
      const found = outcome.status === 'converged' ? outcome.parameters[number - 1] : NaN;

      expect(found).toAgreeTo(Number(certified), { digits: 9 });
    },
  );

  test.each(set.standardErrors.map((value, j) => [j + 1, value] as const))(
    'standard error of b%i = %s to 8 digits',
    (number, certified) => {
      const size = set.parameters.length;
      const scaled =
        outcome.status === 'converged'
          ? scaleCovariance(outcome.covariance, outcome.chiSquared, outcome.degreesOfFreedom)
          : null;

      expect(Math.sqrt(scaled?.[(number - 1) * (size + 1)] ?? NaN)).toAgreeTo(Number(certified), {
        digits: 8,
      });
    },
  );

  test('residual sum of squares to 9 digits, degrees of freedom exactly', () => {
    const { chiSquared, degreesOfFreedom } =
      outcome.status === 'converged' ? outcome : { chiSquared: NaN, degreesOfFreedom: NaN };

    expect(chiSquared).toAgreeTo(Number(set.residualSquares), { digits: 9 });
    expect(degreesOfFreedom).toBe(set.degreesOfFreedom);
  });
});
