/** The worked demonstration is what evaluate() says of its trials. */
import { describe, expect, test } from 'vitest';
import { brakedMagnetEvidence } from '#server/database/seeders/demo/braked-magnet-evidence.ts';
import { fallingCupsEvidence } from '#server/database/seeders/demo/falling-cups-evidence.ts';
import { leaningSpoutEvidence } from '#server/database/seeders/demo/leaning-spout-evidence.ts';
import { evaluate } from '#shared/evidence/evaluate.ts';
import { evidenceSchema, type Evidence } from '#shared/evidence/evidence.ts';
import { findValue } from '#shared/evidence/find-value.ts';
import type { ClaimFinding, Findings } from '#shared/evidence/findings.ts';

const FIRST_START = new Date('2026-03-03T12:00:00.000Z');

/** The spout with another shared part of the tray. */
function withTray(amount: string): Evidence {
  const spout = leaningSpoutEvidence(FIRST_START);
  return {
    ...spout,
    instruments: spout.instruments.map((instrument) =>
      instrument.id === 'i-tray'
        ? { ...instrument, parts: instrument.parts.map((part) => (part.shared ? { ...part, amount } : part)) }
        : instrument,
    ),
  };
}

function claim(findings: Findings, id: string): ClaimFinding {
  const found = findings.claims.get(id);
  if (found === undefined) throw new Error(`no claim ${id}`);
  return found;
}

const spout = leaningSpoutEvidence(FIRST_START);
const findings = evaluate(spout);

describe('leaning spout', () => {
  test('the evidence is what the schema asks for, and nothing lies ahead of the first start', () => {
    expect(evidenceSchema.safeParse(spout).success).toBe(true);
    expect(spout.trials).toHaveLength(31);
    expect(spout.trials.every(({ at }) => Date.parse(at) < FIRST_START.getTime())).toBe(true);
  });

  test('the upright fit gives a speed coefficient of 0.967 ± 0.008 from 10 of 12 trials', () => {
    const fit = findings.comparisons.get('c-upright');

    expect(fit?.parameters[0]?.value).toBeCloseTo(0.967, 3);
    expect(fit?.parameters[0]?.u).toBeCloseTo(0.0083, 4);
    expect(fit?.used).toHaveLength(10);
    expect(fit?.outside).toEqual([
      { trial: 'trial-a11', why: 'outside trust' },
      { trial: 'trial-a12', why: 'outside trust' },
    ]);
    expect(fit?.sentence).toBe(
      'With C_v alone free, 10 of the 12 trials of series A give 0.967\u00a0±\u00a00.008; χ² is 4.4 for 9 degrees of freedom.',
    );
  });

  test('at 38° the mean of B10, B12 and B13 leaks from the largest range by 2.3 u', () => {
    const third = claim(findings, 'claim-3');

    expect(third.verdict).toBe('Leaks');
    expect(third.z).toBeCloseTo(-2.3, 1);
    expect(third.trials).toEqual(['trial-b10', 'trial-b12', 'trial-b13']);
    expect(third.sentence).toBe(
      'Measured and predicted differ by 2.3\u00a0u; this claim holds at 2\u00a0u or less.',
    );
    expect(third.short).toBe('measured 1.5\u00a0cm less, 2.3\u00a0u');
  });

  test('with 0.30 cm shared by all readings of the tray claim 3 would hold', () => {
    const third = claim(evaluate(withTray('0.30')), 'claim-3');

    expect(third.verdict).toBe('Holds');
    expect(third.z).toBeCloseTo(-1.66, 2);
  });

  test('claims 1 and 2 hold, claim 4 is undecided because one head was measured', () => {
    expect(claim(findings, 'claim-1')).toMatchObject({
      verdict: 'Holds',
      short: '10 trials, worst 0.8\u00a0u',
    });
    expect(claim(findings, 'claim-2')).toMatchObject({
      verdict: 'Holds',
      short: '11 trials, worst 1.2\u00a0u',
    });
    expect(claim(findings, 'claim-4')).toMatchObject({
      verdict: 'Undecided',
      short: 'one head measured so far',
    });
  });

  test('B11 is left out of the mean at 38° and drawn hollow in the chart', () => {
    const mean = findValue(findings, spout, {
      kind: 'mean',
      quantity: 'q-r',
      series: 'series-b',
      at: { 'q-theta': { text: '38.0', unit: '°' } },
    });
    const chart = findings.charts.get('chart-lean');

    expect(mean).toMatchObject({ shape: 'scalar', madeOf: { kind: 'mean', leftOut: ['trial-b11'] } });
    expect(mean.shape === 'scalar' && mean.value).toAgreeTo(0.464333333, { digits: 8 });
    expect(chart?.excluded.map(({ trial }) => trial)).toEqual(['trial-b11']);
    expect(chart?.points).toHaveLength(7);
  });

  test('surface tension is named, but not measured: its fault spoils nothing else', () => {
    expect(findings.values.get('q-sigma')).toMatchObject({ shape: 'fault', code: 'not measured' });
    expect(
      [...findings.values.values()].filter(
        (value) => value.shape === 'fault' && value.code !== 'no single value',
      ),
    ).toHaveLength(1);
  });
});

describe('falling cups', () => {
  const cups = evaluate(fallingCupsEvidence(FIRST_START));

  test('with the approach C_d is 0.80 ± 0.01 and the law holds; without it the law leaks', () => {
    expect(cups.comparisons.get('c-approach')?.parameters[0]?.value).toBeCloseTo(0.802, 3);
    expect(cups.comparisons.get('c-approach')?.parameters[0]?.u).toBeCloseTo(0.0105, 4);
    expect(cups.comparisons.get('c-approach')?.pValue).toBeGreaterThan(0.01);
    expect(cups.comparisons.get('c-steady')?.pValue).toBeLessThan(0.01);
  });

  test('three claims hold and one is undecided', () => {
    expect([...cups.claims.values()].map(({ verdict }) => verdict)).toEqual([
      'Holds',
      'Holds',
      'Holds',
      'Undecided',
    ]);
  });
});

describe('braked magnet', () => {
  const evidence = brakedMagnetEvidence(FIRST_START);
  const magnet = evaluate(evidence);

  test('the brake constant is 0.369 from the drops and 0.370 ± 0.013 for a dipole', () => {
    const measured = findValue(magnet, evidence, { kind: 'quantity', quantity: 'q-k' });
    const dipole = findValue(magnet, evidence, { kind: 'quantity', quantity: 'q-kd' });
    const cylinder = findValue(magnet, evidence, { kind: 'quantity', quantity: 'q-kc' });

    expect(measured).toMatchObject({ value: expect.closeTo(0.3691, 4), u: expect.closeTo(0.0007, 4) });
    expect(dipole).toMatchObject({ value: expect.closeTo(0.3701, 4), u: expect.closeTo(0.0132, 4) });
    expect(cylinder).toMatchObject({ value: expect.closeTo(0.3627, 4) });
  });

  test('two claims hold, two wait', () => {
    expect([...magnet.claims.values()].map(({ verdict }) => verdict)).toEqual([
      'Holds',
      'Holds',
      'Undecided',
      'Undecided',
    ]);
  });
});
