import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { stackNotes } from '#src/features/notes/view/stack-notes.ts';

describe('stackNotes', () => {
  test('when two notes want the same height: the later moves down and is not level any more', () => {
    const stacked = stackNotes([
      { id: 'a', top: 100, height: 60 },
      { id: 'b', top: 110, height: 40 },
      { id: 'c', top: 400, height: 40 },
    ]);

    expect(stacked).toEqual([
      { id: 'a', top: 100, isLevel: true },
      { id: 'b', top: 180, isLevel: false },
      { id: 'c', top: 400, isLevel: true },
    ]);
  });

  test('of any notes: none covers another, and none stands above its words', () => {
    const note = fc.record({ top: fc.nat(3_000), height: fc.integer({ min: 20, max: 300 }) });
    fc.assert(
      fc.property(fc.array(note, { maxLength: 30 }), (notes) => {
        const wanted = notes.map((one, index) => ({ ...one, id: String(index) }));
        const known = new Map(wanted.map((one) => [one.id, one]));
        const stacked = stackNotes(wanted);
        stacked.forEach(({ id, top }, index) => {
          expect(top).toBeGreaterThanOrEqual(known.get(id)?.top ?? Infinity);
          const before = stacked[index - 1];
          if (before) expect(top).toBeGreaterThanOrEqual(before.top + (known.get(before.id)?.height ?? 0));
        });
      }),
    );
  });
});
