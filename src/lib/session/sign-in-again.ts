import { createStore } from '#src/lib/store/create-store.ts';

/** Who was signed in when the session ended, while we wait for them to sign in again in place. */
export interface EndedSession {
  readonly userId: string;
  readonly email: string;
  readonly name: string;
}

export const endedSession = createStore<EndedSession | null>(null);

let known: EndedSession | null = null;
let asking: { promise: Promise<boolean>; settle: (signedIn: boolean) => void } | null = null;

/** Called with each session that the server confirms, and with null after signing out. */
export function rememberSession(session: EndedSession | null): void {
  known = session;
}

/** Opens the dialog for whoever was signed in; false at once when nobody was, or when they close it. */
export function askToSignInAgain(): Promise<boolean> {
  if (asking) return asking.promise;
  if (!known) return Promise.resolve(false);
  let settle: (signedIn: boolean) => void = () => undefined;
  const promise = new Promise<boolean>((resolve) => {
    settle = resolve;
  });
  asking = { promise, settle };
  endedSession.set(known);
  return promise;
}

export function settleSignInAgain(signedIn: boolean): void {
  const waiting = asking;
  asking = null;
  endedSession.set(null);
  waiting?.settle(signedIn);
}
