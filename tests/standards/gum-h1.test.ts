/**
 * End-gauge calibration. Source: JCGM 100:2008, H.1 (table H.1 and H.1.6); the long digits come from the same
 * formulas evaluated to 8 figures.
 */
import { describe, expect, test } from 'vitest';
import { combinedDegreesOfFreedom } from '#shared/uncertainty/combined-degrees-of-freedom.ts';
import { combineContributions } from '#shared/uncertainty/combine-contributions.ts';
import { expandedUncertainty } from '#shared/uncertainty/expanded-uncertainty.ts';
import { standardUncertainty } from '#shared/uncertainty/standard-uncertainty.ts';
import { statedUncertainty } from '#shared/uncertainty/stated-uncertainty.ts';
import { uncertaintyBudget } from '#shared/uncertainty/uncertainty-budget.ts';

/** l = lₛ + d − lₛ(δα·θ + αₛ·δθ); lengths in nm, temperatures in °C. */
const LENGTH = 50_000_623;
const MEAN_TEMPERATURE = -0.1;
const EXPANSION = 11.5e-6;

const standard = [{ source: 'certificate', c: 25 }];
const difference = [
  { source: 'scatter of five', c: 5.8 },
  { source: 'comparator, random', c: 3.9 },
  { source: 'comparator, systematic', c: 6.7 },
];
const expansionDifference = [{ source: 'δα', c: statedUncertainty(1e-6, 'rectangular') }];
const temperature = [
  { source: 'mean temperature', c: 0.2 },
  { source: 'cycle', c: statedUncertainty(0.5, 'arcsine') },
];
const expansion = [{ source: 'αₛ', c: statedUncertainty(2e-6, 'rectangular') }];
const temperatureDifference = [{ source: 'δθ', c: statedUncertainty(0.05, 'rectangular') }];

const FREEDOM: Readonly<Record<string, number>> = {
  certificate: 18,
  'scatter of five': 24,
  'comparator, random': 5,
  'comparator, systematic': 8,
  δα: 50,
  δθ: 2,
};

/** δα and δθ are 0, so that θ and αₛ have no first-order effect. */
const length = combineContributions([
  { derivative: 1, contributions: standard },
  { derivative: 1, contributions: difference },
  { derivative: -LENGTH * MEAN_TEMPERATURE, contributions: expansionDifference },
  { derivative: 0, contributions: temperature },
  { derivative: 0, contributions: expansion },
  { derivative: -LENGTH * EXPANSION, contributions: temperatureDifference },
]);
const freedomOf = (source: string) => ({ degreesOfFreedom: FREEDOM[source] ?? Infinity });

describe('GUM H.1, end-gauge calibration', () => {
  test('the difference of the gauges, from three components: u is 9.7 nm with 25.6 degrees of freedom', () => {
    expect(standardUncertainty(difference)).toAgreeTo(9.681942, { digits: 6 });
    expect(combinedDegreesOfFreedom(difference, freedomOf)).toBeCloseTo(25.6, 0);
  });

  test.each([
    ['certificate', 25],
    ['δα', 2.9],
    ['δθ', 16.6],
  ])('the component %s is %d nm', (source, expected) => {
    const component = length.find((part) => part.source === source);

    expect(Math.abs(component?.c ?? NaN)).toBeCloseTo(expected, 1);
  });

  test('the length of the gauge: u is 32 nm (31.663879)', () => {
    expect(standardUncertainty(length)).toAgreeTo(31.663879, { digits: 7 });
  });

  test('effective degrees of freedom are 16.75, and 99 % is covered by 93 nm with t = 2.92', () => {
    const degrees = combinedDegreesOfFreedom(length, freedomOf);

    const { expanded, k } = expandedUncertainty(standardUncertainty(length), degrees, 0.99);

    expect(degrees).toBeCloseTo(16.75, 1);
    expect(k).toBeCloseTo(2.92, 2);
    expect(expanded).toBeCloseTo(92.48, 1);
  });

  test('the budget puts the certificate first and its shares add to 1', () => {
    const budget = uncertaintyBudget(length);

    expect(budget[0]?.source).toBe('certificate');
    expect(budget.reduce((sum, { share }) => sum + share, 0)).toAgreeTo(1, { digits: 14 });
  });

  test('second-order terms, added by hand: 11.7 nm and 1.7 nm give 34 nm', () => {
    const secondA = LENGTH * statedUncertainty(1e-6, 'rectangular') * standardUncertainty(temperature);
    const secondB = LENGTH * statedUncertainty(2e-6, 'rectangular') * statedUncertainty(0.05, 'rectangular');

    expect(secondA).toBeCloseTo(11.7, 1);
    expect(secondB).toBeCloseTo(1.7, 1);
    expect(Math.hypot(standardUncertainty(length), secondA, secondB)).toAgreeTo(33.80655, { digits: 6 });
  });
});
