/** Verbs with which a task asks for something without a question mark. */
const ASKING =
  /^(analy[sz]e|build|calculate|characteri[sz]e|classify|compare|construct|demonstrate|derive|describe|design|determine|discuss|estimate|evaluate|examine|explain|explore|find|identify|investigate|maximi[sz]e|measure|minimi[sz]e|model|optimi[sz]e|predict|propose|quantify|show|study)\b/i;

const MOST = 12;
const LONGEST = 400;

/**
 * The verbs of a task, as its statement asks them: its questions and its sentences that begin with a verb that
 * asks. A statement that has neither is taken by its last sentence.
 */
export function proposeTasks(statement: string): string[] {
  const sentences = [...new Intl.Segmenter('en', { granularity: 'sentence' }).segment(statement)]
    .map(({ segment }) => segment.replace(/\s+/g, ' ').trim())
    .filter((sentence) => sentence !== '');
  const asking = sentences.filter((sentence) => sentence.endsWith('?') || ASKING.test(sentence));
  const proposed = asking.length > 0 ? asking : sentences.slice(-1);
  return proposed.slice(0, MOST).map((sentence) => sentence.slice(0, LONGEST));
}
