import type { Trial } from '#shared/evidence/evidence.ts';
import { registerOf } from '#shared/evidence/register.ts';
import type { Evidence } from '#shared/evidence/evidence.ts';
import { counted } from '#shared/evidence/words.ts';

/** More stretches than this are told as a count. */
const MOST_STRETCHES = 4;

/**
 * Trials by name, neighbours drawn together: "B13 to B19, C1"; many that are no neighbours are only counted.
 *
 * @param ids - of trials of this evidence
 */
export function nameTrials(ids: readonly string[], evidence: Evidence): string {
  const register = registerOf(evidence);
  const letterOf = (trial: Trial) => register.series.get(trial.series)?.letter ?? '';
  const trials = ids
    .flatMap((id) => register.trials.get(id) ?? [])
    .map((trial) => ({ letter: letterOf(trial), number: trial.number }))
    .sort((a, b) => (a.letter === b.letter ? a.number - b.number : a.letter < b.letter ? -1 : 1));
  const stretches: { letter: string; from: number; to: number }[] = [];
  for (const { letter, number } of trials) {
    const last = stretches.at(-1);
    if (last?.letter === letter && last.to === number - 1) last.to = number;
    else stretches.push({ letter, from: number, to: number });
  }
  if (stretches.length > MOST_STRETCHES) return counted(trials.length, 'trial');
  return stretches.map(({ letter, from, to }) => nameStretch(letter, from, to)).join(', ');
}

function nameStretch(letter: string, from: number, to: number): string {
  if (from === to) return `${letter}${from}`;
  return to === from + 1 ? `${letter}${from}, ${letter}${to}` : `${letter}${from} to ${letter}${to}`;
}
