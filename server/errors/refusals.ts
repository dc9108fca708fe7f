/** The refusals that every part of the API shares, so that they read the same everywhere. */
import { AppError } from './app-error.ts';

/** For what does not exist, and for what the asker may not see: there is no difference. */
export function notFound(what = 'There is nothing at this address.'): AppError {
  return new AppError(404, 'not-found', what);
}

/** The one refusal of every link that opens nothing: unknown, forged, used, withdrawn, over. */
export function deadLink(): AppError {
  return notFound('This link opens nothing. It may have been used, or its time is over. Ask for a new one.');
}

export function notSignedIn(): AppError {
  return new AppError(401, 'not-signed-in', 'You are not signed in. Sign in and try again.');
}

export function notAllowed(sentence: string): AppError {
  return new AppError(403, 'not-allowed', sentence);
}

export function invalid(fields: Readonly<Record<string, string>>): AppError {
  const [first] = Object.values(fields);
  return new AppError(422, 'invalid', first ?? 'Something in the request cannot be read.', { fields });
}

export function changedMeanwhile(): AppError {
  return new AppError(
    409,
    'changed-meanwhile',
    'Somebody changed this since you opened it. Look at the new state and make your change again.',
  );
}
