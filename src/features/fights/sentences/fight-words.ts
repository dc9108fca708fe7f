import type { KeptFight } from '#shared/contracts/fights.ts';
import type { Person } from '#shared/contracts/teams.ts';
import type { StageRole } from '#shared/talk/event.ts';

/** What we do in a stage. */
export const ROLE_WORDS: Readonly<Record<StageRole, string>> = {
  report: 'we report',
  oppose: 'we oppose',
  review: 'we review',
};

/** "In stage 1 we report Leaning Spout to Gannet Bank; Ines Farrow takes the stage." */
export function stageSentence(
  stage: KeptFight['stages'][number],
  index: number,
  titleOf: (problem: number) => string,
  people: readonly Person[],
): string {
  const against = stage.against ? `${stage.role === 'report' ? ' to ' : ' of '}${stage.against}` : '';
  const person = people.find(({ id }) => id === stage.person);
  const who = person ? `; ${person.name} takes the stage` : '';
  return `In stage ${index + 1} ${ROLE_WORDS[stage.role]} ${titleOf(stage.problem)}${against}${who}.`;
}
