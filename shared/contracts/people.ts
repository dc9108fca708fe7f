/** Who may come in and how: invitations, forgotten passphrases, the first start, and the mail a team caused. */
import { z } from 'zod';
import { endpoint } from './endpoint.ts';
import { MIN_PASSPHRASE_LENGTH, roleSchema, sessionSchema } from './session.ts';

/** A person's name as it stands in mail and on paper: one line. */
export const personNameSchema = z
  .string()
  .trim()
  .min(1, 'Write the name, as it should stand in the report.')
  .max(80, 'Use at most 80 characters.')
  .regex(/^[^\p{Cc}]*$/u, 'Write the name on one line.');

export const emailSchema = z
  .string()
  .trim()
  .toLowerCase()
  .max(254, 'Use at most 254 characters.')
  .pipe(z.email('Write the whole address, like ines.farrow@skerry.example.'));

export const newPassphraseSchema = z
  .string()
  .min(
    MIN_PASSPHRASE_LENGTH,
    `Use at least ${MIN_PASSPHRASE_LENGTH} characters; four unrelated words do well.`,
  )
  .max(200, 'Use at most 200 characters.');

/** Always 204, whether anybody has this address or not; 429 `too-many-attempts`. */
export const askForReset = endpoint({
  method: 'POST',
  path: '/api/password-resets',
  body: z.object({ email: emailSchema }),
  status: 204,
  answer: null,
});

/** Sets a new passphrase and signs the person out everywhere; one 404 for every link that opens nothing. */
export const resetPassphrase = endpoint({
  method: 'PUT',
  path: '/api/password-resets/:token',
  body: z.object({ passphrase: newPassphraseSchema }),
  status: 204,
  answer: null,
});

/** What an invitation says to who holds its link. */
export const openInvitationSchema = z.object({
  team: z.string(),
  university: z.string(),
  role: roleSchema,
  by: z.string(),
  name: z.string(),
  email: z.string(),
  until: z.string(),
  /** There is an account with this address: its passphrase is asked for, and no new one is made. */
  hasAccount: z.boolean(),
});
export type OpenInvitation = z.infer<typeof openInvitationSchema>;

/** One 404 for every link that opens nothing: unknown, used, withdrawn, over. */
export const getInvitation = endpoint({
  method: 'GET',
  path: '/api/invitations/:token',
  body: null,
  status: 200,
  answer: openInvitationSchema,
});

/** Joins and signs in. Without an account this makes one; 422 `wrong-passphrase` with one; 409 `administrator`. */
export const acceptInvitation = endpoint({
  method: 'POST',
  path: '/api/invitations/:token',
  body: z.object({
    name: personNameSchema,
    passphrase: z.string().min(1, 'Write your passphrase.').max(200),
  }),
  status: 200,
  answer: z.object({ team: z.string(), session: sessionSchema }),
});

export const invitationSchema = z.object({
  id: z.string(),
  name: z.string(),
  email: z.string(),
  role: roleSchema,
  by: z.string(),
  at: z.string(),
  until: z.string(),
  isOver: z.boolean(),
});
export type Invitation = z.infer<typeof invitationSchema>;

/** Captain only: the invitations nobody has accepted yet. */
export const listInvitations = endpoint({
  method: 'GET',
  path: '/api/teams/:team/invitations',
  body: null,
  status: 200,
  answer: z.array(invitationSchema).max(100),
});

/** Captain only. An earlier invitation to the same address ends; 409 `in-the-team`, `too-many-invitations`. */
export const invite = endpoint({
  method: 'POST',
  path: '/api/teams/:team/invitations',
  body: z.object({ name: personNameSchema, email: emailSchema, role: roleSchema }),
  status: 201,
  answer: invitationSchema,
});

/** Captain only: its link opens nothing from now on. */
export const withdrawInvitation = endpoint({
  method: 'DELETE',
  path: '/api/teams/:team/invitations/:invitation',
  body: null,
  status: 204,
  answer: null,
});

/** Captain only; 404 for who is not of the team, 409 `last-captain`. What the person wrote stays. */
export const removeMember = endpoint({
  method: 'DELETE',
  path: '/api/teams/:team/members/:person',
  body: null,
  status: 204,
  answer: null,
});

export const mailKindSchema = z.enum(['invitation']);
export type MailKind = z.infer<typeof mailKindSchema>;
export const mailStateSchema = z.enum(['waiting', 'sent', 'failed']);
export type MailState = z.infer<typeof mailStateSchema>;

export const mailEntrySchema = z.object({
  id: z.string(),
  kind: mailKindSchema,
  to: z.object({ name: z.string(), address: z.string() }),
  subject: z.string(),
  /** Without the link: that is for the one person. */
  text: z.string(),
  state: mailStateSchema,
  writtenAt: z.string(),
  sentAt: z.string().nullable(),
  nextTryAt: z.string().nullable(),
  error: z.string().nullable(),
  mayRetry: z.boolean(),
});
export type MailEntry = z.infer<typeof mailEntrySchema>;

/** Captain only: the mail that the team caused, never a new passphrase. */
export const listOutbox = endpoint({
  method: 'GET',
  path: '/api/teams/:team/outbox',
  body: null,
  status: 200,
  answer: z.array(mailEntrySchema).max(100),
});

/** Captain only: tries again at once; 409 `not-to-be-sent`. */
export const retryMail = endpoint({
  method: 'POST',
  path: '/api/teams/:team/outbox/:mail/retry',
  body: null,
  status: 204,
  answer: null,
});
