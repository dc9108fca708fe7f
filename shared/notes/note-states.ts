/** The states of a margin note and what may be done in each. */

/** open: nobody has said anything to it; answered: the team has; agreed, held to: settled. */
export const NOTE_STATES = ['open', 'answered', 'agreed', 'held to'] as const;
export type NoteState = (typeof NOTE_STATES)[number];

/**
 * Whether nothing is left to be said.
 *
 * @example isSettled('held to') // => true
 * @example isSettled('answered') // => false
 */
export function isSettled(state: NoteState): boolean {
  return state === 'agreed' || state === 'held to';
}

/**
 * What a note is once it is no longer settled.
 *
 * @param answers - how many it has
 * @example stateWithout(0) // => 'open'
 */
export function stateWithout(answers: number): NoteState {
  return answers > 0 ? 'answered' : 'open';
}
