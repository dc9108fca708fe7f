/** Verdicts, each with the sentence why. */
import { describe, expect, test } from 'vitest';
import { evaluate } from '#shared/evidence/evaluate.ts';
import type { ClaimTest, Evidence } from '#shared/evidence/evidence.ts';
import type { ClaimFinding } from '#shared/evidence/findings.ts';
import {
  constant,
  evidence,
  model,
  quantity,
  reading,
  recorded,
  ruler,
  series,
  spring,
  trial,
} from '../evidence/small-evidence.ts';

function judged(of: Evidence, claimTest: ClaimTest | null, openBecause?: string): ClaimFinding {
  const claim = {
    id: 'cl',
    n: 1,
    text: 'A claim.',
    test: claimTest,
    declaredAt: '2026-02-01',
    ...(openBecause === undefined ? {} : { openBecause }),
  };
  const found = evaluate({ ...of, claims: [claim] }).claims.get('cl');
  if (found === undefined) throw new Error('no verdict');
  return found;
}

/** Lengths around 100 mm at one setting; predicted 100 ± 0.3 mm. */
function lengths(texts: readonly string[], predictedU: string | undefined = '0.3'): Evidence {
  return evidence({
    instruments: [ruler('ruler', '0.2', null, 'mm')],
    quantities: [
      recorded('n', '1'),
      recorded('L', 'mm', 'ruler'),
      constant('d', reading('100', 'mm', predictedU)),
      quantity('P', 'mm', { origin: 'predicted', model: 'm1' }),
    ],
    series: [series('A', ['n'], ['L'])],
    trials: texts.map((text, i) => trial('A', i + 1, { n: reading('1', '1'), L: reading(text, 'mm') })),
    models: [
      {
        ...model('m1', 1, 'L', [
          { defines: 'L', expr: '{n}*{d}' },
          { defines: 'P', expr: '{d}' },
        ]),
        limits: [{ quantity: 'n', min: null, max: reading('5', '1') }],
      },
    ],
    comparisons: [],
  });
}

const at = { n: reading('1', '1') };
const equals: ClaimTest = {
  kind: 'equals',
  measured: { kind: 'mean', quantity: 'L', series: 'A', at },
  expected: { kind: 'prediction', model: 'm1', quantity: 'L', series: 'A', at },
};

describe('a value against a prediction', () => {
  test('within k u: holds, and the sentence gives the margin', () => {
    const found = judged(lengths(['100.2', '100.4', '100.3']), equals);

    expect(found).toMatchObject({ verdict: 'Holds', k: 2, trials: ['A1', 'A2', 'A3'] });
    expect(found.sentence).toBe(
      'Measured and predicted differ by 0.9\u00a0u; this claim holds at 2\u00a0u or less.',
    );
    expect(found.short).toBe('3 trials, 0.9\u00a0u');
  });

  test('beyond k u: leaks, and says on which side', () => {
    const found = judged(lengths(['101.2', '101.4', '101.3']), equals);

    expect(found.verdict).toBe('Leaks');
    expect(found.z).toBeCloseTo(1.3 / Math.hypot(0.3, 0.2 / Math.sqrt(3)), 2);
    expect(found.short).toMatch(/^measured 1\.30\smm more, 4\.0\su$/u);
  });

  test('exactly what k the problem has decides', () => {
    const of = lengths(['101.2', '101.4', '101.3']);

    expect(judged({ ...of, settings: { ...of.settings, k: 5 } }, equals)).toMatchObject({
      verdict: 'Holds',
      k: 5,
    });
  });

  test.each([
    [
      ['100.2', '100.4'],
      /^Two kept trials stand behind the measured side, and three are needed\. One more would decide it\.$/u,
      '2 trials of 3',
    ],
    [
      ['100.2'],
      /^One kept trial stands behind the measured side, and three are needed\. Two more would decide it\.$/u,
      '1 trial of 3',
    ],
  ] as const)('%j alone: undecided', (texts, sentence, short) => {
    const found = judged(lengths(texts), equals);

    expect(found.verdict).toBe('Undecided');
    expect(found.sentence).toMatch(sentence);
    expect(found.short).toBe(short);
  });

  test('an excluded trial does not stand behind anything', () => {
    const of = lengths(['100.2', '100.4', '100.3']);
    const excluded = { reason: 'slipped', by: 'Ines Farrow', at: '2026-03-01' };

    const found = judged(
      { ...of, trials: of.trials.map((row) => (row.id === 'A1' ? { ...row, excluded } : row)) },
      equals,
    );

    expect(found).toMatchObject({ verdict: 'Undecided', trials: ['A2', 'A3'] });
  });

  test('nothing known of the prediction’s uncertainty: undecided', () => {
    const of = lengths(['100.2', '100.4', '100.3'], undefined);
    const bare = {
      ...of,
      quantities: of.quantities.map((row) => (row.id === 'd' ? constant('d', reading('100', 'mm')) : row)),
    };

    expect(judged(bare, equals)).toMatchObject({
      verdict: 'Undecided',
      sentence: 'The expected side has no uncertainty, so that a difference means nothing.',
    });
  });

  test('a setting outside trust: undecided', () => {
    const of = lengths(['100.2', '100.4', '100.3']);
    const narrow = {
      ...of,
      models: of.models.map((row) => ({
        ...row,
        limits: [{ quantity: 'n', min: reading('2', '1'), max: null }],
      })),
    };

    const found = judged(narrow, equals);

    expect(found).toMatchObject({ verdict: 'Undecided', short: 'outside trust' });
    expect(found.sentence).toBe(
      'n lies outside the range in which model 1 is trusted, so that it says nothing here.',
    );
  });

  test('a predicted quantity of the register, as the expected side: its model’s trust counts at the measured setting', () => {
    const of = lengths(['100.2', '100.4', '100.3']);
    const narrow = {
      ...of,
      models: of.models.map((row) => ({
        ...row,
        limits: [{ quantity: 'n', min: reading('2', '1'), max: null }],
      })),
    };
    const register: ClaimTest = { ...equals, expected: { kind: 'quantity', quantity: 'P', series: 'A' } };

    expect(judged(of, register).verdict).toBe('Holds');
    expect(judged(narrow, register).short).toBe('outside trust');
  });

  test('a side that cannot be had: undecided, with its fault', () => {
    const gone: ClaimTest = { ...equals, expected: { kind: 'quantity', quantity: 'x' } };

    expect(judged(lengths(['100.2', '100.4', '100.3']), gone)).toMatchObject({
      verdict: 'Undecided',
      fault: { code: 'source gone' },
    });
  });
});

describe('a model against its trials', () => {
  test('p within 0.01 and 0.99: holds, and the worst setting is told', () => {
    const found = judged(spring(), { kind: 'model fits', comparison: 'c1' });

    expect(found.verdict).toBe('Holds');
    expect(found.trials).toHaveLength(15);
    expect(found.short).toMatch(/^15 trials, worst \d\.\d\su$/u);
    expect(found.sentence).toMatch(
      /p = [\d.]+\) over 15 trials; the worst setting misses by .*\su; this claim holds while p lies between 0\.01 and 0\.99\.$/u,
    );
  });

  test('a trial far off: leaks', () => {
    const of = spring();
    const trials = of.trials.map((row) =>
      row.id === 'A15' ? trial('A', 15, { w: reading('250', 'g'), L: reading('155', 'mm') }) : row,
    );

    expect(judged({ ...of, trials }, { kind: 'model fits', comparison: 'c1' }).verdict).toBe('Leaks');
  });

  test('agreement far better than the uncertainties: undecided, because nothing is tested', () => {
    const of = { ...spring(), instruments: [ruler('ruler', '3', '0.5', 'mm')] };

    const found = judged(of, { kind: 'model fits', comparison: 'c1' });

    expect(found.verdict).toBe('Undecided');
    expect(found.sentence).toMatch(/too large to test the model\. Find smaller ones\.$/u);
  });

  test('relative weights: no test possible', () => {
    const of = spring();
    const relative = {
      ...of,
      comparisons: of.comparisons.map((row) => ({ ...row, weights: 'relative' as const })),
    };

    expect(judged(relative, { kind: 'model fits', comparison: 'c1' })).toMatchObject({
      verdict: 'Undecided',
      short: 'no test possible',
    });
  });
});

describe('a value against a limit', () => {
  const bound = (side: 'at most' | 'at least', text: string, unit = 'mm'): ClaimTest => ({
    kind: 'bound',
    value: { kind: 'mean', quantity: 'L', series: 'A', at },
    side,
    limit: reading(text, unit),
  });
  const of = lengths(['100.2', '100.4', '100.3']);

  test.each([
    ['at most', '101', 'Holds'],
    ['at most', '100', 'Leaks'],
    ['at most', '100.4', 'Undecided'],
    ['at least', '100', 'Holds'],
    ['at least', '101', 'Leaks'],
  ] as const)('%s %s mm: %s', (side, text, verdict) => {
    expect(judged(of, bound(side, text)).verdict).toBe(verdict);
  });

  test('undecided: says below which uncertainty it would be decided', () => {
    const found = judged(of, bound('at most', '100.4'));

    expect(found.sentence).toMatch(
      /^100\.30\s±\s0\.12\smm is 0\.9\su from the limit, and 2\su is needed either way\. An uncertainty below 0\.05\smm would decide it\.$/u,
    );
  });

  test('a limit in seconds: cannot be compared', () => {
    expect(judged(of, bound('at most', '1', 's'))).toMatchObject({
      verdict: 'Undecided',
      fault: { code: 'dimension mismatch' },
    });
  });
});

describe('a claim without a test', () => {
  test('the team’s reason stands', () => {
    expect(judged(spring(), null, 'one head measured so far')).toMatchObject({
      verdict: 'Undecided',
      sentence: 'One head measured so far.',
      short: 'one head measured so far',
    });
  });

  test('no reason given: says that no test is chosen', () => {
    expect(judged(spring(), null).sentence).toBe('No test has been chosen for this claim yet.');
  });
});
