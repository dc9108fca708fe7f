import type { Evidence, Trial } from '#shared/evidence/evidence.ts';
import { counted } from '#shared/evidence/words.ts';
import { asClause } from '#shared/report/left-out.ts';
import { nameTrials } from './name-trials.ts';

/** What happened to trials between two states, one sentence for each kind; excluded ones with their reasons. */
export function compareTrials(before: Evidence, after: Evidence): string[] {
  const earlier = new Map(before.trials.map((trial) => [trial.id, trial]));
  const logged = after.trials.filter((trial) => !earlier.has(trial.id) && !trial.withdrawn);
  const changed = after.trials.flatMap((trial) => {
    const was = earlier.get(trial.id);
    return was === undefined ? [] : [{ was, is: trial }];
  });
  const where = (test: (was: Trial, is: Trial) => boolean) =>
    changed.filter(({ was, is }) => test(was, is)).map(({ is }) => is);
  return [
    ...loggedSentence(logged, after),
    ...[
      ...logged.filter(({ excluded }) => excluded),
      ...where((was, is) => !was.excluded && !!is.excluded),
    ].map((trial) => excludedSentence(trial, after)),
    ...namedSentence(
      where((was, is) => !!was.excluded && !is.excluded),
      after,
      'brought back',
    ),
    ...namedSentence(
      where((was, is) => !was.withdrawn && !!is.withdrawn),
      after,
      'taken back',
    ),
    ...namedSentence(
      where((was, is) => JSON.stringify(was.values) !== JSON.stringify(is.values)),
      after,
      'corrected',
    ),
  ];
}

function idsOf(trials: readonly Trial[]): string[] {
  return trials.map(({ id }) => id);
}

function loggedSentence(trials: readonly Trial[], evidence: Evidence): string[] {
  if (trials.length === 0) return [];
  const names = nameTrials(idsOf(trials), evidence);
  const count = counted(trials.length, 'trial');
  return [names === count ? `${count} logged.` : `${count} logged: ${names}.`];
}

function excludedSentence(trial: Trial, evidence: Evidence): string {
  return `${nameTrials([trial.id], evidence)} excluded: ${asClause(trial.excluded?.reason ?? '')}.`;
}

function namedSentence(trials: readonly Trial[], evidence: Evidence, what: string): string[] {
  return trials.length === 0 ? [] : [`${nameTrials(idsOf(trials), evidence)} ${what}.`];
}
