import { MeasuredKey, PredictedKey } from '#src/components/legend-keys.tsx';
import { daysBetween, dayAndMonth, timeOfDay } from '#src/lib/dates/say-date.ts';
import { countOf } from '#src/lib/say/count-of.ts';
import { countInWords } from '#shared/evidence/words.ts';
import { useEvidence } from '#src/lib/evidence/use-evidence.ts';
import type { Trial } from '#shared/evidence/evidence.ts';

/** Title of the log, and in a sentence how things stand. */
export function TrialsHead({ now }: { readonly now: Date }) {
  const { trials, settings } = useEvidence();
  const kept = trials.filter((trial) => !trial.withdrawn);
  return (
    <header className="flex flex-wrap items-end gap-x-5 gap-y-2 px-7 pb-3.5 max-sm:px-4">
      <div>
        <h1 className="h2">Trials</h1>
        <p className="mt-0.5 text-sm text-ink-2">{stateSentence(kept, now)}</p>
      </div>
      <div className="ml-auto flex gap-4.5 pb-0.5 text-xs">
        <MeasuredKey />
        <PredictedKey words={`predicted ± ${settings.k} u`} />
      </div>
    </header>
  );
}

/** "One of 31 is excluded. Last today at 14:18." */
export function stateSentence(trials: readonly Trial[], now: Date): string {
  if (trials.length === 0) return 'No trial is logged yet.';
  const excluded = trials.filter((trial) => trial.excluded).length;
  const last = new Date(Math.max(...trials.map((trial) => Date.parse(trial.at))));
  const number = countInWords(excluded);
  const first =
    excluded === 0
      ? `${countOf(trials.length, 'trial')}, none excluded.`
      : `${number.charAt(0).toUpperCase()}${number.slice(1)} of ${trials.length} ${excluded === 1 ? 'is' : 'are'} excluded.`;
  const day = daysBetween(now, last) === 0 ? 'today' : dayAndMonth(last);
  return `${first} Last ${day} at ${timeOfDay(last)}.`;
}
