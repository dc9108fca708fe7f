import { countInWords, startSentence } from '#shared/evidence/words.ts';
import type { ClaimFinding, Fault } from '#shared/evidence/findings.ts';

/** An undecided verdict, and why. */
export function undecided(found: ClaimFinding, sentence: string, short: string): ClaimFinding {
  return { ...found, verdict: 'Undecided', sentence, short };
}

/** A claim one side of which cannot be had. */
export function withFault(found: ClaimFinding, fault: Fault): ClaimFinding {
  return { ...found, verdict: 'Undecided', sentence: fault.sentence, short: 'cannot be tested yet', fault };
}

/** That too few trials stand behind a claim, and how many more would do. */
export function tooFewTrials(trials: number, needed: number): { sentence: string; short: string } {
  const stands = trials === 1 ? 'stands' : 'stand';
  const more = needed - trials;
  return {
    sentence: startSentence(
      `${countInWords(trials)} kept trial${trials === 1 ? '' : 's'} ${stands} behind the measured side, and ${countInWords(needed)} are needed. ${startSentence(countInWords(more))} more would decide it.`,
    ),
    short: trials === 0 ? 'no trials' : `${trials} trial${trials === 1 ? '' : 's'} of ${needed}`,
  };
}
