import type { Leak, LeakName } from './leak.ts';
import type { SectionName } from '#shared/report/schema/section-type.ts';

/** An answer that the team prepared. */
export interface LeakAnswer {
  readonly leak: string;
  readonly text: string;
  readonly by: string;
  /** ISO 8601. */
  readonly at: string;
  /** What the leak rested on when it was answered. */
  readonly basis: string;
}

/** A leak as it was last found, for when it is found no more. */
export interface LeakMark {
  readonly leak: string;
  readonly name: LeakName;
  readonly section: SectionName;
  readonly question: string;
  readonly evidence: string;
}

/** A leak with what the team has done about it. */
export type PreparedLeak =
  | {
      readonly state: 'open' | 'answered';
      readonly leak: Leak;
      readonly answer: LeakAnswer | null;
      /** The numbers have moved since the answer was written. */
      readonly isStale: boolean;
    }
  | { readonly state: 'mended'; readonly mark: LeakMark; readonly answer: LeakAnswer | null };

/**
 * Leaks with their answers, the hardest first; then what was found once and is found no more, as mended.
 *
 * @param leaks - found now, in their order
 * @param answers - prepared by the team
 * @param marks - every leak that was ever found
 */
export function prepareLeaks(
  leaks: readonly Leak[],
  answers: readonly LeakAnswer[],
  marks: readonly LeakMark[],
): readonly PreparedLeak[] {
  const byLeak = new Map(answers.map((answer) => [answer.leak, answer]));
  const found = new Set(leaks.map(({ id }) => id));
  return [
    ...leaks.map((leak): PreparedLeak => {
      const answer = byLeak.get(leak.id) ?? null;
      return {
        state: answer === null ? 'open' : 'answered',
        leak,
        answer,
        isStale: answer !== null && answer.basis !== leak.basis,
      };
    }),
    ...marks
      .filter((mark) => !found.has(mark.leak))
      .map((mark): PreparedLeak => ({ state: 'mended', mark, answer: byLeak.get(mark.leak) ?? null })),
  ];
}
