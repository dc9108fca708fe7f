import { counted, countInWords, listInWords, startSentence } from '#shared/evidence/words.ts';
import { settingWords } from '#shared/report/setting-words.ts';
import type { LeakRule } from '../leak.ts';

/** Fewer kept trials than this at a setting say little of their scatter. */
export const FEWEST_REPEATS = 3;
/** Settings named one by one; beyond, they are counted. */
const NAMED = 4;

/**
 * Settings that repeat, and yet have fewer than three kept trials: pressure 2 + 0.7 for each of them. One leak for each
 * series; a series in which no setting is repeated is read as a line, not as means, and has none.
 */
export const fewRepeats: LeakRule = {
  name: 'Few repeats',
  code: 'repeats',
  find: ({ evidence, findings }) =>
    evidence.series.flatMap((series) => {
      const groups = findings.groups.get(series.id) ?? [];
      const isRepeated = groups.some(({ kept }) => kept.length >= FEWEST_REPEATS);
      const few = groups.filter(({ kept }) => kept.length > 0 && kept.length < FEWEST_REPEATS);
      if (!isRepeated || few.length === 0) return [];
      const places = few.map(({ settings }) => settingWords(settings, evidence));
      const where = few.length <= NAMED ? listInWords(places) : `${countInWords(few.length)} settings`;
      const least = Math.min(...few.map(({ kept }) => kept.length));
      return [
        {
          about: [series.id],
          section: 'Experiment',
          question: `${startSentence(counted(least, 'trial'))} at ${places[0] ?? ''}: is that enough to know its scatter?`,
          evidence: `Series ${series.letter} has fewer than three trials at ${where}.`,
          mend: 'Repeat these settings until each has at least three trials.',
          place: { kind: 'series', id: series.id },
          pressure: 2 + 0.7 * few.length,
        },
      ];
    }),
};
