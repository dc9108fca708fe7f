import { describe, expect, test } from 'vitest';
import { decimalToDoubleDouble, parseDecimal } from '#shared/numeric/decimal.ts';
import { doubleDoubleLeastSquares } from '#shared/numeric/double-double-least-squares.ts';
import { ONE, multiply, type DoubleDouble } from '#shared/numeric/double-double.ts';
import { item } from '#shared/numeric/element.ts';
import filip from '#tests/fixtures/nist/filip.json';
import longley from '#tests/fixtures/nist/longley.json';
import noint1 from '#tests/fixtures/nist/noint1.json';
import noint2 from '#tests/fixtures/nist/noint2.json';
import norris from '#tests/fixtures/nist/norris.json';
import pontius from '#tests/fixtures/nist/pontius.json';
import wampler1 from '#tests/fixtures/nist/wampler1.json';
import wampler2 from '#tests/fixtures/nist/wampler2.json';
import wampler3 from '#tests/fixtures/nist/wampler3.json';
import wampler4 from '#tests/fixtures/nist/wampler4.json';
import wampler5 from '#tests/fixtures/nist/wampler5.json';

// Source: NIST/ITL Statistical Reference Datasets; see tests/fixtures/nist/README.md.
const SETS = [
  norris,
  pontius,
  noint1,
  noint2,
  longley,
  filip,
  wampler1,
  wampler2,
  wampler3,
  wampler4,
  wampler5,
];

function exact(text: string): DoubleDouble {
  const decimal = parseDecimal(text);
  if (decimal === null) throw new Error(`not a decimal: ${text}`);
  return decimalToDoubleDouble(decimal);
}

function power(value: DoubleDouble, exponent: number): DoubleDouble {
  return Array.from({ length: exponent }, () => value).reduce(multiply, ONE);
}

describe.each(SETS)('NIST $name ($level), from the decimals as typed', (set) => {
  const rows = set.rows.map((row) => row.map(exact));
  const solution = doubleDoubleLeastSquares(
    set.terms.map((term) => rows.map((row) => power(item(row, term.variable), term.power))),
    rows.map((row) => item(row, row.length - 1)),
  );

  test('is determined', () => {
    expect(solution.status).toBe('solved');
  });

  test.each(set.parameters.map((value, j) => [j, value] as const))(
    'B%i = %s to 12 digits',
    (index, certified) => {
      const found = solution.status === 'solved' ? solution.coefficients[index] : NaN;

      expect(found).toAgreeTo(Number(certified), { digits: 12 });
    },
  );

  test.each(set.standardErrors.map((value, j) => [j, value] as const))(
    'standard error of B%i = %s to 12 digits',
    (index, certified) => {
      if (solution.status !== 'solved') throw new Error(solution.status);
      const variance = solution.residualSquares / solution.degreesOfFreedom;
      const unscaled = item(solution.covariance, index * (set.terms.length + 1));

      expect(Math.sqrt(variance * unscaled)).toAgreeTo(Number(certified), { digits: 12 });
    },
  );

  test('residual sum of squares to 12 digits', () => {
    const found = solution.status === 'solved' ? solution.residualSquares : NaN;

    expect(found).toAgreeTo(Number(set.residualSquares), { digits: 12 });
  });
});
