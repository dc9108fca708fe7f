import type { ComparisonPoint } from '#shared/evidence/findings.ts';
import { figureInWords, listInWords } from '#shared/evidence/words.ts';
import { defendedComparisons } from '../defended-comparisons.ts';
import type { FoundLeak, LeakRule } from '../leak.ts';
import { settingNamer, type SettingNamer } from '../setting-namer.ts';

/** Settings named one by one; beyond, they are counted. */
const NAMED = 4;

/** Residuals beyond k inside trust: pressure 2 + 2 · largest |z|. One leak for each comparison. */
export const leftUnexplained: LeakRule = {
  name: 'Left unexplained',
  code: 'unexplained',
  find: ({ evidence, findings, document }) =>
    defendedComparisons(evidence, document).flatMap((comparison) => {
      const { k } = evidence.settings;
      const points = findings.comparisons.get(comparison.id)?.points ?? [];
      const missed = points.filter(({ trusted, z }) => trusted && z !== null && Math.abs(z) > k);
      if (missed.length === 0) return [];
      const words = settingNamer(
        points.map(({ settings }) => settings),
        evidence,
      );
      return [leakOf(comparison.id, missed, { k, words })];
    }),
};

function leakOf(
  comparison: string,
  missed: readonly ComparisonPoint[],
  { k, words }: { readonly k: number; readonly words: SettingNamer },
): FoundLeak {
  const sizes = missed.map(({ z }) => z ?? 0);
  const worst = Math.max(...sizes.map(Math.abs));
  const places = missed.map(({ settings }) => words(settings));
  const isOneWay = sizes.every((z) => Math.sign(z) === Math.sign(sizes[0] ?? 0));
  const verb = (sizes[0] ?? 0) < 0 ? 'overshoots' : 'falls short';
  const does = isOneWay ? `${verb} by more than ${k}\u00a0u` : `misses by more than ${k}\u00a0u`;
  const where = missed.length === 1 ? `at ${places[0] ?? ''}` : `at ${missed.length} of its settings`;
  const list =
    missed.length <= NAMED
      ? `${missed.length === 1 ? 'The residual' : 'The residuals'} at ${listInWords(places)} ${missed.length === 1 ? 'is' : 'are'} ${listInWords(sizes.map(figureInWords))}\u00a0u.`
      : `${missed.length} residuals lie beyond ${k}\u00a0u, the worst at ${words(worstOf(missed).settings)} with ${figureInWords(worstOf(missed).z ?? 0)}\u00a0u.`;
  return {
    about: [comparison],
    section: 'Comparison',
    question: `Your model ${does} ${where}. What have you left out?`,
    evidence: list,
    mend: 'Add the term that is missing, narrow where the model is trusted, or say in the text what the gap is put down to.',
    place: { kind: 'comparison', id: comparison },
    pressure: 2 + 2 * worst,
  };
}

function worstOf(points: readonly ComparisonPoint[]): ComparisonPoint {
  return points.reduce((a, b) => (Math.abs(b.z ?? 0) > Math.abs(a.z ?? 0) ? b : a));
}
