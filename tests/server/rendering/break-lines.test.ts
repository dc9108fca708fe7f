import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { breakLines, type LineRules } from '#server/rendering/text/break-lines.ts';
import { FORCED, type ParagraphItem } from '#server/rendering/text/paragraph-items.ts';

const box = (width: number): ParagraphItem<null> => ({ kind: 'box', width, content: null });
const glue: ParagraphItem<null> = { kind: 'glue', width: 4, stretch: 2, shrink: 1 };
const hyphen: ParagraphItem<null> = { kind: 'penalty', width: 2, cost: 60, flagged: true };
const fill: ParagraphItem<null>[] = [
  { kind: 'glue', width: 0, stretch: 1e5, shrink: 0 },
  { kind: 'penalty', width: 0, cost: FORCED, flagged: false },
];

/** Words of these widths with a space between. */
function words(...widths: readonly number[]): ParagraphItem<null>[] {
  return [...widths.flatMap((width, i) => (i === 0 ? [box(width)] : [glue, box(width)])), ...fill];
}

const justified = (width: number, tolerance = 3): LineRules => ({ width, tolerance, raggedness: null });

/** Words on each line. */
function linesOf(items: readonly ParagraphItem<null>[], rules: LineRules): number[] | null {
  const lines = breakLines(items, rules);
  return (
    lines?.map(({ from, to }) => items.slice(from, to).filter((item) => item.kind === 'box').length) ?? null
  );
}

describe('breakLines', () => {
  test('words that fill two lines exactly, when broken: end where the width is reached', () => {
    const items = words(10, 10, 10, 10, 10, 10);

    const lines = breakLines(items, justified(38));

    expect(linesOf(items, justified(38))).toEqual([3, 3]);
    expect(lines?.map((line) => line.ratio)).toEqual([0, expect.closeTo(0, 3)]);
  });

  test('a line too long by what its glue can give, when broken: is shrunk, not broken earlier', () => {
    const items = words(10, 10, 12, 30);

    expect(breakLines(items, justified(38))?.[0]).toMatchObject({ ratio: -1 });
  });

  test('first lines that could be fuller, when that would spoil a later one: give a word away', () => {
    // First fit takes four words and leaves a long one alone, which cannot be stretched to the width.
    const items = words(6, 6, 6, 6, 25, 12, 6);

    expect(linesOf(items, justified(36))).toEqual([3, 2, 2]);
  });

  test('a word longer than the line, when nothing fits: stands alone on a line that is too full', () => {
    expect(linesOf(words(10, 90, 10), justified(40, 1e4))).toEqual([1, 1, 1]);
    expect(linesOf(words(10, 90, 10), justified(40, 3))).toBeNull();
  });

  test('a word that may be hyphenated, when the line needs it: ends at the hyphen', () => {
    const items = [box(10), glue, box(10), glue, box(8), hyphen, box(20), glue, box(13), ...fill];

    expect(breakLines(items, justified(38))?.[0]).toMatchObject({ to: 5, ratio: 0 });
  });

  test('a ragged paragraph, when broken: never shrinks its spaces', () => {
    const lines = breakLines(words(10, 10, 12, 30, 10), { width: 35, tolerance: 1e4, raggedness: 10 });

    expect(lines?.every((line) => line.ratio >= 0)).toBe(true);
  });

  test('a forced break inside, when broken: ends its line', () => {
    const items = [box(10), ...fill, ...words(10, 10)];

    expect(linesOf(items, justified(40))).toEqual([1, 2]);
  });

  test('law: no other set of breaks has fewer demerits', () => {
    const widths = fc.array(fc.integer({ min: 3, max: 18 }), { minLength: 1, maxLength: 9 });
    fc.assert(
      fc.property(widths, fc.integer({ min: 25, max: 45 }), (values, width) => {
        const items = words(...values);
        const rules = justified(width, 4);

        const lines = breakLines(items, rules);

        const best = leastDemerits(items, rules);
        expect(lines === null ? Infinity : demeritsOf(lines.map(({ ratio }) => ratio))).toBeCloseTo(best, 3);
      }),
      { seed: 7, numRuns: 300 },
    );
  });
});

const fitness = (ratio: number) => (ratio < -0.5 ? 0 : ratio <= 0.5 ? 1 : ratio <= 1 ? 2 : 3);

function demeritsOf(ratios: readonly number[]): number {
  let before = 1;
  return ratios.reduce((sum, ratio) => {
    const jump = Math.abs(fitness(ratio) - before) > 1 ? 3000 : 0;
    before = fitness(ratio);
    return sum + (10 + 100 * Math.abs(ratio) ** 3) ** 2 + jump;
  }, 0);
}

/** Tries every set of breaks between words. */
function leastDemerits(items: readonly ParagraphItem<null>[], { width, tolerance }: LineRules): number {
  const boxes = items.flatMap((item) => (item.kind === 'box' ? [item.width] : []));
  const ratioOf = (from: number, to: number): number => {
    const natural = boxes.slice(from, to).reduce((sum, one) => sum + one, 0) + 4 * (to - from - 1);
    const isLast = to === boxes.length;
    const slack = width - natural;
    if (slack === 0) return 0;
    if (slack < 0) return to - from > 1 && -slack <= to - from - 1 ? slack / (to - from - 1) : -Infinity;
    const stretch = 2 * (to - from - 1) + (isLast ? 1e5 : 0);
    return stretch > 0 ? slack / stretch : Infinity;
  };
  const search = (from: number, ratios: readonly number[]): number => {
    if (from === boxes.length) return demeritsOf(ratios);
    let best = Infinity;
    for (let to = from + 1; to <= boxes.length; to++) {
      const ratio = ratioOf(from, to);
      if (ratio < -1 || ratio > tolerance) continue;
      best = Math.min(best, search(to, [...ratios, ratio]));
    }
    return best;
  };
  return search(0, []);
}
