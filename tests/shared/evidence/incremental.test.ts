/** A cache saves time and nothing else. */
import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { leaningSpoutEvidence } from '#server/database/seeders/demo/leaning-spout-evidence.ts';
import type { EvidenceChange } from '#shared/evidence/evidence-change.ts';
import { applyStep } from '#shared/evidence/apply-change.ts';
import { createEvaluationCache, evaluate } from '#shared/evidence/evaluate.ts';
import type { Evidence, Trial } from '#shared/evidence/evidence.ts';
import { reading } from './small-evidence.ts';

const spout = leaningSpoutEvidence(new Date('2026-03-03T12:00:00.000Z'));

function trialRow(of: Evidence, id: string): Trial {
  const row = of.trials.find((trial) => trial.id === id);
  if (row === undefined) throw new Error(`no trial ${id}`);
  return structuredClone(row);
}

function withReading(of: Evidence, id: string, quantity: string, text: string): EvidenceChange {
  const row = trialRow(of, id);
  const before = row.values[quantity] ?? reading(text, 'cm');
  return { table: 'trials', id, row: { ...row, values: { ...row.values, [quantity]: { ...before, text } } } };
}

const trialId = fc.constantFrom(...spout.trials.map(({ id }) => id));
const number = fc.integer({ min: 10, max: 600 }).map((tenths) => (tenths / 10).toFixed(1));

/** One of the changes that people make, as a function of the evidence it meets. */
const change: fc.Arbitrary<(of: Evidence) => EvidenceChange> = fc.oneof(
  fc.tuple(trialId, number).map(
    ([id, text]) =>
      (of: Evidence) =>
        withReading(of, id, 'q-r', text),
  ),
  trialId.map((id) => (of: Evidence): EvidenceChange => {
    const row = trialRow(of, id);
    const excluded =
      row.excluded === undefined ? { reason: 'try', by: 'Ines Farrow', at: '2026-03-03' } : undefined;
    return { table: 'trials', id, row: { ...row, excluded } };
  }),
  trialId.map((id) => (of: Evidence): EvidenceChange => ({
    table: 'trials',
    id,
    row: { ...trialRow(of, id), withdrawn: { by: 'Ines Farrow', at: '2026-03-03' } },
  })),
  fc.tuple(fc.integer({ min: 1, max: 9 }), number).map(([n, text]) => (of: Evidence): EvidenceChange => ({
    table: 'trials',
    id: `new-${of.version}-${n}`,
    row: {
      ...trialRow(of, 'trial-b1'),
      id: `new-${of.version}-${n}`,
      number: 100 + of.version,
      values: { 'q-theta': reading('38', '°'), 'q-r': reading(text, 'cm') },
    },
  })),
  number.map((text) => (of: Evidence): EvidenceChange => {
    const row = structuredClone(of.quantities.find(({ id }) => id === 'q-y'));
    if (row?.def.origin !== 'constant') throw new Error('y is a constant');
    return {
      table: 'quantities',
      id: 'q-y',
      row: { ...row, def: { ...row.def, reading: reading(text, 'cm') } },
    };
  }),
  fc
    .constantFrom('{q-cv}^2*{q-h}', '{q-cv}*{q-h}', '{q-h}*{q-y}', '2*(')
    .map((expr) => (of: Evidence): EvidenceChange => {
      const row = structuredClone(of.models.find(({ id }) => id === 'model-3'));
      if (row === undefined) throw new Error('no model 3');
      const equations = row.equations.map((equation) =>
        equation.defines === 'q-head' ? { ...equation, expr } : equation,
      );
      return { table: 'models', id: 'model-3', row: { ...row, equations } };
    }),
  fc.constantFrom('one or two digits', 'two digits').map((rounding) => (of: Evidence): EvidenceChange => ({
    table: 'settings',
    row: { ...of.settings, rounding: rounding === 'two digits' ? 'two digits' : 'one or two digits' },
  })),
  fc.constantFrom('0.1', '0.3', '0').map((amount) => (of: Evidence): EvidenceChange => {
    const row = structuredClone(of.instruments.find(({ id }) => id === 'i-tray'));
    if (row === undefined) throw new Error('no tray');
    return {
      table: 'instruments',
      id: 'i-tray',
      row: { ...row, parts: row.parts.map((part) => ({ ...part, amount })) },
    };
  }),
  fc.constant((): EvidenceChange => ({ table: 'comparisons', id: 'c-upright', row: null })),
);

describe('evaluation with a cache', () => {
  test('law: after any edits the findings equal those from nothing', () => {
    fc.assert(
      fc.property(fc.array(change, { minLength: 1, maxLength: 6 }), (changes) => {
        const cache = createEvaluationCache();
        let of = spout;
        evaluate(of, cache);
        for (const make of changes) {
          of = applyStep(of, [make(of)], of.version + 1);
          const findings = evaluate(of, cache);

          expect(findings).toEqual(evaluate(structuredClone(of)));
        }
      }),
      { numRuns: 40 },
    );
  });

  test('the same evidence twice, without a cache: equal to the last bit', () => {
    expect(evaluate(structuredClone(spout))).toEqual(evaluate(spout));
  });

  test('one reading of series B: comparisons of series A are the same objects as before', () => {
    const cache = createEvaluationCache();
    const before = evaluate(spout, cache);

    const after = evaluate(applyStep(spout, [withReading(spout, 'trial-b12', 'q-r', '47.1')], 2), cache);

    expect(after.comparisons.get('c-upright')).toBe(before.comparisons.get('c-upright'));
    expect(after.comparisons.get('c-plain')).toBe(before.comparisons.get('c-plain'));
    expect(after.charts.get('chart-upright')).toBe(before.charts.get('chart-upright'));
    expect(after.values.get('q-cv')).toBe(before.values.get('q-cv'));
    expect(after.values.get('q-theta@series-b')).toBe(before.values.get('q-theta@series-b'));
    expect(after.comparisons.get('c-lean')).not.toBe(before.comparisons.get('c-lean'));
  });

  test('an edit, then the edit undone: the findings are as they were', () => {
    const cache = createEvaluationCache();
    const before = evaluate(spout, cache);
    const edited = applyStep(spout, [withReading(spout, 'trial-a3', 'q-r', '27.4')], 2);
    evaluate(edited, cache);

    const after = evaluate(applyStep(edited, [withReading(edited, 'trial-a3', 'q-r', '26.8')], 1), cache);

    expect(after).toEqual(before);
  });
});

describe('applying a step', () => {
  test('untouched rows and tables stay the same objects', () => {
    const after = applyStep(spout, [withReading(spout, 'trial-b1', 'q-r', '36.5')], 2);

    expect(after.version).toBe(2);
    expect(after.quantities).toBe(spout.quantities);
    expect(after.trials[0]).toBe(spout.trials[0]);
    expect(after.trials.filter((row, i) => row !== spout.trials[i])).toHaveLength(1);
  });

  test('a removed row is gone, a new row comes last, settings are replaced', () => {
    const claim = { ...structuredClone(spout.claims[0]), id: 'claim-9', n: 9 } as Evidence['claims'][number];

    const after = applyStep(
      spout,
      [
        { table: 'claims', id: 'claim-1', row: null },
        { table: 'claims', id: 'claim-9', row: claim },
        { table: 'settings', row: { ...spout.settings, k: 3 } },
      ],
      5,
    );

    expect(after.claims.map(({ id }) => id)).toEqual(['claim-2', 'claim-3', 'claim-4', 'claim-9']);
    expect(after.settings.k).toBe(3);
  });
});
