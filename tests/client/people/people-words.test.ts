import { expect, test } from 'vitest';
import type { Invitation, MailEntry } from '#shared/contracts/people.ts';
import { invitationWords, mailWords, peopleSentence } from '#src/features/people/sentences/people-words.ts';

const NOW = new Date(2026, 2, 3, 12, 0);
const at = (hour: number, minute: number) => new Date(2026, 2, 3, hour, minute).toISOString();

const MAIL: MailEntry = {
  id: 'm1',
  kind: 'invitation',
  to: { name: 'Tarjei Holm', address: 'tarjei.holm@skerry.example' },
  subject: 'Tern Rock asks you to join',
  text: '[the link]',
  state: 'waiting',
  writtenAt: at(11, 0),
  sentAt: null,
  nextTryAt: at(11, 0),
  error: null,
  mayRetry: true,
};
const INVITATION: Invitation = {
  id: 'i1',
  name: 'Tarjei Holm',
  email: 'tarjei.holm@skerry.example',
  role: 'member',
  by: 'Ines Farrow',
  at: at(11, 0),
  until: new Date(2026, 2, 17, 12).toISOString(),
  isOver: false,
};

test.each([
  ['not tried yet', {}, 'on its way'],
  ['sent today', { state: 'sent', sentAt: at(11, 2) }, 'sent 11:02'],
  [
    'waiting for the mail server',
    { error: 'The mail server could not be reached.', nextTryAt: at(12, 5) },
    'waits. The mail server could not be reached. It is tried again 12:05.',
  ],
  [
    'refused for good',
    { state: 'failed', nextTryAt: null, error: 'The mail server refused this address.' },
    'not sent. The mail server refused this address.',
  ],
] as const)('mail, when %s: says so', (_case, change, words) => {
  expect(mailWords({ ...MAIL, ...change }, NOW)).toBe(words);
});

test('invitation, while it is open and once it is over: says until when', () => {
  expect(invitationWords(INVITATION)).toBe('student, asked by Ines Farrow; open until 17 March');
  expect(invitationWords({ ...INVITATION, isOver: true })).toBe('student; its time was over on 17 March');
});

test('people, when an invitation is over: does not count it among those that wait', () => {
  expect(peopleSentence(5, [INVITATION, { ...INVITATION, isOver: true }])).toBe(
    '5 people in the team. 1 invitation waits.',
  );
});
