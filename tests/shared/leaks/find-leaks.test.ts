/** Where an opponent will press: the demonstration's leaks with their pressure by hand, and the laws of their identity. */
import { describe, expect, test } from 'vitest';
import { leaningSpoutEvidence } from '#server/database/seeders/demo/leaning-spout-evidence.ts';
import { leaningSpoutReport } from '#server/database/seeders/demo/leaning-spout-report.ts';
import { evaluate } from '#shared/evidence/evaluate.ts';
import type { Evidence } from '#shared/evidence/evidence.ts';
import { findLeaks, leakForce } from '#shared/leaks/find-leaks.ts';
import type { Leak } from '#shared/leaks/leak.ts';
import { prepareLeaks } from '#shared/leaks/prepared-leak.ts';

const evidence = leaningSpoutEvidence(new Date('2026-03-03T12:00:00Z'));
const document = leaningSpoutReport(evidence);

function leaksOf(changed: Partial<Evidence> = {}): readonly Leak[] {
  const whole = { ...evidence, ...changed };
  return findLeaks({ evidence: whole, findings: evaluate(whole), document });
}

function get(leaks: readonly Leak[], id: string): Leak {
  const found = leaks.find((leak) => leak.id === id);
  if (!found) throw new Error(`there is no leak ${id} among ${leaks.map((leak) => leak.id).join(', ')}`);
  return found;
}

describe('leaks of the Leaning Spout', () => {
  const leaks = leaksOf();

  test('the hardest first, and the word follows the pressure', () => {
    const pressures = leaks.map(({ pressure }) => pressure);

    expect(pressures).toEqual([...pressures].sort((a, b) => b - a));
    expect(leaks.every(({ pressure, force }) => force === leakForce(pressure))).toBe(true);
  });

  // 2 + 2 · |z| with the worst z of the leans, −3.5.
  test('left unexplained: the leaned comparison alone, not the earlier model', () => {
    const leak = get(leaks, 'unexplained:c-lean');

    expect(leak.question).toBe(
      'Your model overshoots by more than 2\u00a0u at 3 of its settings. What have you left out?',
    );
    expect(leak.pressure).toBeCloseTo(2 + 2 * 3.5, 0);
    expect(leaks.filter(({ name }) => name === 'Left unexplained')).toHaveLength(1);
  });

  // 6 + 0.7 for its one place in the report.
  test('a claim without trials: claim 4, with the team’s own reason', () => {
    const leak = get(leaks, 'claim:claim-4');

    expect(leak.evidence).toBe('No trial stands behind claim 4: one head measured so far.');
    expect(leak.pressure).toBeCloseTo(6.7, 10);
  });

  // 4.5 + 0.8 for each of two places.
  test('named, not measured: surface tension', () => {
    const leak = get(leaks, 'named:q-sigma');

    expect(leak.pressure).toBeCloseTo(6.1, 10);
    expect(leak.section).toBe('Model');
  });

  // The mean of B10, B12, B13 is 46.43 cm; with B11 (43.5 cm) 45.70 cm.
  test('excluded trial: tells the mean with and without it', () => {
    expect(get(leaks, 'excluded:trial-b11').evidence).toBe(
      'With it the mean is 45.7\u00a0cm, without it 46.4\u00a0cm.',
    );
  });

  // 2 + 0.5 for each of two numbers.
  test('not tied: one leak for the section, with its numbers', () => {
    const leak = get(leaks, 'tied:Comparison');

    expect(leak.evidence).toBe('Two numbers of Comparison follow no trial: 25 cm and 3 mm.');
    expect(leak.pressure).toBe(3);
  });

  test('a condition not checked: each effect of the newest model whose size is not estimated', () => {
    expect(
      leaks
        .filter(({ name }) => name === 'A condition not checked')
        .map(({ id }) => id)
        .sort(),
    ).toEqual(['condition:drag:model-3', 'condition:model-3:surface tension', 'condition:model-3:swirl']);
  });
});

describe('leaks, when the evidence changes', () => {
  test('a reading moves: identities stay, and what the answer rested on is another', () => {
    const before = leaksOf();
    const after = leaksOf({
      trials: evidence.trials.map((trial) =>
        trial.id === 'trial-b10'
          ? { ...trial, values: { ...trial.values, 'q-r': { text: '47.4', unit: 'cm' } } }
          : trial,
      ),
    });

    expect(after.map(({ id }) => id).sort()).toEqual(before.map(({ id }) => id).sort());
    expect(get(after, 'excluded:trial-b11').basis).not.toBe(get(before, 'excluded:trial-b11').basis);
    expect(get(after, 'claim:claim-4').basis).toBe(get(before, 'claim:claim-4').basis);
  });

  test('surface tension gets a value: it is not asked about any more', () => {
    const after = leaksOf({
      quantities: evidence.quantities.map((quantity) =>
        quantity.id === 'q-sigma'
          ? { ...quantity, def: { origin: 'constant', reading: { text: '72', unit: 'mN/m' }, parts: [] } }
          : quantity,
      ),
    });

    expect(after.some(({ id }) => id === 'named:q-sigma')).toBe(false);
  });

  test('a setting loses its third trial: few repeats, 2 + 0.7 for one setting', () => {
    const after = leaksOf({ trials: evidence.trials.filter(({ id }) => id !== 'trial-b19') });
    const leak = get(after, 'repeats:series-b');

    expect(leak.evidence).toBe('Series B has fewer than three trials at 55°.');
    expect(leak.pressure).toBe(2.7);
  });

  test('no evidence and no text: nothing leaks', () => {
    const empty = {
      ...evidence,
      quantities: [],
      series: [],
      trials: [],
      models: [],
      comparisons: [],
      claims: [],
      charts: [],
    };

    expect(
      findLeaks({ evidence: empty, findings: evaluate(empty), document: { type: 'doc', content: [] } }),
    ).toEqual([]);
  });
});

describe('prepared leaks', () => {
  const leak = get(leaksOf(), 'named:q-sigma');
  const answer = {
    leak: leak.id,
    text: 'We took 72 mN/m.',
    by: 'Kasimir Lund',
    at: '2026-03-03T12:00:00Z',
    basis: leak.basis,
  };
  const mark = {
    leak: leak.id,
    name: leak.name,
    section: leak.section,
    question: leak.question,
    evidence: leak.evidence,
  };

  test('with an answer that rests on the same numbers: answered, and not to be looked at again', () => {
    expect(prepareLeaks([leak], [answer], [mark])).toMatchObject([{ state: 'answered', isStale: false }]);
  });

  test('with an answer that rested on others: to be looked at again', () => {
    expect(prepareLeaks([leak], [{ ...answer, basis: 'other' }], [mark])).toMatchObject([{ isStale: true }]);
  });

  test('found once and no more: mended, with its last question', () => {
    expect(prepareLeaks([], [], [mark])).toEqual([{ state: 'mended', mark, answer: null }]);
  });
});
