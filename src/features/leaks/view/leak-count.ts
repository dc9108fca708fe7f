import type { PreparedLeak } from '#shared/leaks/prepared-leak.ts';
import { countInWords, startSentence } from '#shared/evidence/words.ts';

/** "Four leaks are open, two have an answer and one is mended." */
export function leakCount(leaks: readonly PreparedLeak[]): string {
  const count = (state: PreparedLeak['state']) => leaks.filter((leak) => leak.state === state).length;
  const [open, answered, mended] = [count('open'), count('answered'), count('mended')];
  if (leaks.length === 0) return 'Nothing leaks that can be found here.';
  const parts = [
    `${countInWords(open)} ${open === 1 ? 'leak is' : 'leaks are'} open`,
    ...(answered > 0 ? [`${countInWords(answered)} ${answered === 1 ? 'has' : 'have'} an answer`] : []),
    ...(mended > 0 ? [`${countInWords(mended)} ${mended === 1 ? 'is' : 'are'} mended`] : []),
  ];
  const last = parts.pop() ?? '';
  return `${startSentence(parts.length === 0 ? last : `${parts.join(', ')} and ${last}`)}.`;
}
