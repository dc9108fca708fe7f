export interface MailFailure {
  /** What went wrong, for the captain; never what the server said, which may name hosts and accounts. */
  readonly words: string;
  /** Another try would be answered the same. */
  readonly isFinal: boolean;
}

/** What a failed try means. */
export function mailFailure(error: unknown): MailFailure {
  const { code, responseCode } = (error ?? {}) as { code?: unknown; responseCode?: unknown };
  if (code === 'EAUTH') {
    return { words: 'The mail server did not accept the sign-in of this installation.', isFinal: false };
  }
  if (code === 'EENVELOPE' && typeof responseCode === 'number' && responseCode >= 500) {
    return { words: 'The mail server refused this address. Look whether it is spelt right.', isFinal: true };
  }
  if (typeof responseCode === 'number') {
    return { words: `The mail server did not take it (${responseCode}).`, isFinal: false };
  }
  return { words: 'The mail server could not be reached.', isFinal: false };
}
