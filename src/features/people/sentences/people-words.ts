import type { Invitation, MailEntry } from '#shared/contracts/people.ts';
import type { Role } from '#shared/contracts/session.ts';
import type { Fight } from '#shared/contracts/teams.ts';
import { dayAndMonth, timeOrDay } from '#src/lib/dates/say-date.ts';
import { countOf } from '#src/lib/say/count-of.ts';

export const ROLE_WORDS: Readonly<Record<Role, string>> = {
  captain: 'captain; may also freeze, lend and invite',
  member: 'student',
  advisor: 'advisor',
};

export const ROLE_OPTIONS = [
  { value: 'member', words: 'student' },
  { value: 'advisor', words: 'advisor' },
  { value: 'captain', words: 'captain' },
] as const;

const BEFORE = { report: 'reports', oppose: 'opposes', review: 'reviews' } as const;
const AFTER = { report: 'reported', oppose: 'opposed', review: 'reviewed' } as const;

/** What a person does in a fight: "reports", or "reported" once it is over. */
export function stageWords(role: keyof typeof BEFORE, fight: Fight, now: Date): string {
  return (new Date(fight.at) > now ? BEFORE : AFTER)[role];
}

/** "Open until 17 March; asked by Ines Farrow", or that its time is over. */
export function invitationWords({ role, by, until, isOver }: Invitation): string {
  const day = dayAndMonth(new Date(until));
  const kind = role === 'member' ? 'student' : role;
  return isOver ? `${kind}; its time was over on ${day}` : `${kind}, asked by ${by}; open until ${day}`;
}

/** Where a mail is on its way. */
export function mailWords({ state, writtenAt, sentAt, nextTryAt, error }: MailEntry, now: Date): string {
  if (state === 'sent') return `sent ${timeOrDay(new Date(sentAt ?? writtenAt), now)}`;
  if (state === 'failed') return `not sent. ${error ?? ''}`.trim();
  if (error === null || nextTryAt === null) return 'on its way';
  return `waits. ${error} It is tried again ${timeOrDay(new Date(nextTryAt), now)}.`;
}

/** "5 people. One invitation waits." */
export function peopleSentence(people: number, invitations: readonly Invitation[]): string {
  const open = invitations.filter(({ isOver }) => !isOver).length;
  const waits = open === 0 ? '' : ` ${countOf(open, 'invitation waits', 'invitations wait')}.`;
  return `${countOf(people, 'person', 'people')} in the team.${waits}`;
}
