import type { BodyOf } from '#shared/contracts/endpoint.ts';
import type { changeTrial } from '#shared/contracts/evidence.ts';
import type { Trial } from '#shared/evidence/evidence.ts';
import { AppError } from '#server/errors/app-error.ts';

type Change = BodyOf<typeof changeTrial>['change'];

/** The trial after a change, or 409 `not-possible` when it is not in a state that allows it. */
export function changedTrial(
  trial: Trial,
  change: Change,
  who: { readonly by: string; readonly at: string },
): Trial {
  if (trial.withdrawn) throw notPossible('This trial was taken back. Log it anew.');
  switch (change.kind) {
    case 'correct': {
      const { note, ...rest } = trial;
      const kept = change.note === undefined ? note : change.note || undefined;
      const values = { ...trial.values, ...change.values };
      return { ...rest, values, ...(kept === undefined ? {} : { note: kept }) };
    }
    case 'exclude':
      return { ...trial, excluded: { reason: change.reason, ...who } };
    case 'bring back': {
      if (!trial.excluded) throw notPossible('This trial is not left out.');
      const { excluded: _wasOut, ...rest } = trial;
      return rest;
    }
    case 'withdraw':
      if (trial.by !== who.by) {
        throw notPossible(
          `Only ${trial.by}, who logged this trial, takes it back. Leave it out with a reason instead.`,
        );
      }
      return { ...trial, withdrawn: who };
  }
}

function notPossible(sentence: string): AppError {
  return new AppError(409, 'not-possible', sentence);
}
