import { counted, listInWords } from '#shared/evidence/words.ts';
import { registerOf, seriesName } from '#shared/evidence/register.ts';
import { defendedComparisons } from '../defended-comparisons.ts';
import type { LeakRule } from '../leak.ts';

/** Trials named one by one; beyond, they are counted. */
const NAMED = 5;

/** Trials outside the model's limits that a comparison still uses: pressure 3 + 1 for each trial. */
export const outsideTrust: LeakRule = {
  name: 'Outside trust',
  code: 'trust',
  find: ({ evidence, findings, document }) =>
    defendedComparisons(evidence, document).flatMap((comparison) => {
      const finding = findings.comparisons.get(comparison.id);
      if (finding === undefined) return [];
      const used = new Set(finding.used);
      const trials = finding.points
        .filter(({ trusted }) => !trusted)
        .flatMap((point) => point.trials.filter((trial) => used.has(trial)));
      if (trials.length === 0) return [];
      const register = registerOf(evidence);
      const names = trials.flatMap((id) => {
        const trial = register.trials.get(id);
        const letter = evidence.series.find((series) => series.id === trial?.series)?.letter;
        return trial === undefined || letter === undefined ? [] : [`${letter}${trial.number}`];
      });
      const which = names.length <= NAMED ? listInWords(names) : counted(names.length, 'trial');
      const series = listInWords(comparison.selection.series.map((id) => seriesName(register, id)));
      return [
        {
          about: [comparison.id],
          section: 'Comparison',
          question: `You do not trust your model at ${which}. Why do you compare it there?`,
          evidence: `${names.length === 1 ? `${which} of ${series} lies` : `${which} of ${series} lie`} outside the model’s limits and ${names.length === 1 ? 'is' : 'are'} still compared.`,
          mend: 'Leave these trials out of the comparison, or show that the model may be trusted there.',
          place: { kind: 'comparison', id: comparison.id },
          pressure: 3 + trials.length,
        },
      ];
    }),
};
