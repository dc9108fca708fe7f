import { describe, expect, test } from 'vitest';
import { decimalToDoubleDouble, parseDecimal } from '#shared/numeric/decimal.ts';
import type { DoubleDouble } from '#shared/numeric/double-double.ts';
import { doubleDoubleStdDev } from '#shared/statistics/double-double-std-dev.ts';
import { mean } from '#shared/statistics/mean.ts';
import { sampleStdDev } from '#shared/statistics/sample-std-dev.ts';
import mavro from '#tests/fixtures/nist/mavro.json';
import michelso from '#tests/fixtures/nist/michelso.json';
import numacc1 from '#tests/fixtures/nist/numacc1.json';

function inTurn(first: string, low: string, high: string): string[] {
  return [first, ...Array.from({ length: 500 }, () => [low, high]).flat()];
}

// Source: NIST/ITL Statistical Reference Datasets; see tests/fixtures/nist/README.md.
const SETS = [
  mavro,
  michelso,
  numacc1,
  {
    name: 'NumAcc3',
    level: 'average',
    mean: '1000000.2',
    standardDeviation: '0.1',
    rows: inTurn('1000000.2', '1000000.1', '1000000.3'),
  },
  {
    name: 'NumAcc4',
    level: 'higher',
    mean: '10000000.2',
    standardDeviation: '0.1',
    rows: inTurn('10000000.2', '10000000.1', '10000000.3'),
  },
];

function exact(text: string): DoubleDouble {
  const decimal = parseDecimal(text);
  if (decimal === null) throw new Error(`not a decimal: ${text}`);
  return decimalToDoubleDouble(decimal);
}

describe.each(SETS)('NIST $name ($level)', (set) => {
  test('mean and standard deviation, from the decimals as typed: 14 digits', () => {
    const found = doubleDoubleStdDev(set.rows.map(exact));

    expect(found.mean).toAgreeTo(Number(set.mean), { digits: 14 });
    expect(found.stdDev).toAgreeTo(Number(set.standardDeviation), { digits: 14 });
  });

  test('mean and standard deviation, from doubles: 15 and 8 digits', () => {
    // Eight digits are what rounding NumAcc4's readings to doubles leaves of a deviation of 0.1.
    const readings = set.rows.map(Number);

    expect(mean(readings)).toAgreeTo(Number(set.mean), { digits: 15 });
    expect(sampleStdDev(readings)).toAgreeTo(Number(set.standardDeviation), { digits: 8 });
  });
});
