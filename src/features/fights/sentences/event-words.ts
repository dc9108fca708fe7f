import type { Event, Floor } from '#shared/talk/event.ts';
import { countInWords, listInWords, startSentence } from '#shared/evidence/words.ts';

/** Who has the floor in a block. */
export const FLOOR_WORDS: Readonly<Record<Floor, string>> = {
  reporter: 'the reporter',
  opponent: 'the opponent',
  reviewer: 'the reviewer',
  jury: 'the jury',
  nobody: 'nobody',
};

const OFTEN: Readonly<Record<number, string>> = { 1: 'once', 2: 'twice' };

/** The rules of an event, one sentence each. */
export function ruleSentences({ roles, weights, rules }: Event): readonly string[] {
  const weighed = roles.map((role) => `${role} ${weights[role]}`);
  const often = OFTEN[rules.stagesPerPerson] ?? `${countInWords(rules.stagesPerPerson)} times`;
  return [
    `Marks weigh ${listInWords(weighed)}.`,
    `One person takes the stage at most ${often} in a fight.`,
    rules.copiesEveningBefore
      ? `Copies go out the evening before and close when the ${rules.copyCloses === 'stage ends' ? 'stage' : 'day of the fight'} ends.`
      : 'No copies go out before a fight.',
    `The opponent ${rules.opponentMayShowResults ? 'may' : 'may not'} show results of their own.`,
    `Notes ${rules.notesPassed ? 'may' : 'may not'} be passed to who is on stage.`,
  ];
}

/** "Fifty minutes a stage, twelve of them the report." */
export function minutesSentence({ blocks }: Event): string {
  const end = Math.max(...blocks.map(({ to }) => to));
  const report = blocks.find(({ isReport }) => isReport);
  const minutes = report ? report.to - report.from : 0;
  return startSentence(`${countInWords(end)} minutes a stage, ${countInWords(minutes)} of them the report.`);
}
