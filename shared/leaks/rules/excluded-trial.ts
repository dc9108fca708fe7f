import type { Evidence, Series, Trial, ValueReference } from '#shared/evidence/evidence.ts';
import { findValue } from '#shared/evidence/find-value.ts';
import type { Findings, Scalar } from '#shared/evidence/findings.ts';
import { formatValue } from '#shared/formatting/format-scalar.ts';
import type { LeakRule } from '../leak.ts';

/** A trial left out: pressure 3 + the shift of its setting's mean, in u of that mean, if it were brought back. */
export const excludedTrial: LeakRule = {
  name: 'Excluded trial',
  code: 'excluded',
  find: ({ evidence, findings }) =>
    evidence.trials.flatMap((trial) => {
      const series = evidence.series.find(({ id }) => id === trial.series);
      if (!trial.excluded || trial.withdrawn || series === undefined) return [];
      const shift = shiftOf(trial, series, evidence, findings);
      const name = `${series.letter}${trial.number}`;
      return [
        {
          about: [trial.id],
          section: 'Experiment',
          question: `Why is ${name} missing from your ${shift === null ? 'data' : 'mean'}?`,
          evidence: shift === null ? `It is excluded: ${trial.excluded.reason}` : shift.sentence,
          mend: `Bring ${name} back, or say in the text what went wrong with it and how you know.`,
          place: { kind: 'trial', id: trial.id },
          pressure: 3 + (shift?.inU ?? 0),
        },
      ];
    }),
};

/** What bringing a trial back would do to the mean of its setting; null when it had no reading or stands alone. */
function shiftOf(
  trial: Trial,
  series: Series,
  evidence: Evidence,
  findings: Findings,
): { readonly inU: number; readonly sentence: string } | null {
  const quantity = series.readings.find((id) => trial.values[id] !== undefined);
  const group = findings.groups.get(series.id)?.find(({ excluded }) => excluded.includes(trial.id));
  if (quantity === undefined || group === undefined || group.kept.length === 0) return null;
  const read = (ref: ValueReference): Scalar | null => {
    const found = findValue(findings, evidence, ref);
    return found.shape === 'scalar' ? found : null;
  };
  const without = read({ kind: 'mean', quantity, series: series.id, at: { ...group.settings } });
  const own = read({ kind: 'reading', trial: trial.id, quantity });
  if (without === null || own === null || without.u === null || !(without.u > 0)) return null;
  const n = group.kept.length;
  const withIt = (without.value * n + own.value) / (n + 1);
  const shown = (value: number) =>
    formatValue({ value, u: without.u }, without.unit, evidence.settings.rounding);
  return {
    inU: Math.abs(withIt - without.value) / without.u,
    sentence: `With it the mean is ${shown(withIt)}, without it ${shown(without.value)}.`,
  };
}
