/** Looking after the installation: its teams and accounts, and nothing of what the teams work on. */
import { z } from 'zod';
import { endpoint } from './endpoint.ts';
import { emailSchema, newPassphraseSchema, personNameSchema } from './people.ts';
import { sessionSchema } from './session.ts';

/** 404 unless the link is the one of the first start, unused, and nobody looks after the installation yet. */
export const getSetup = endpoint({
  method: 'GET',
  path: '/api/setup/:token',
  body: null,
  status: 200,
  answer: z.object({ until: z.string() }),
});

/** Makes the administrator's account and signs in; the same 404; 422 for an address that has an account. */
export const setUp = endpoint({
  method: 'POST',
  path: '/api/setup/:token',
  body: z.object({ name: personNameSchema, email: emailSchema, passphrase: newPassphraseSchema }),
  status: 200,
  answer: sessionSchema,
});

export const adminTeamSchema = z.object({
  slug: z.string(),
  name: z.string(),
  university: z.string(),
  people: z.number().int(),
  captains: z.array(z.string()),
  /** Invited as captain and not here yet. */
  invited: z.array(z.object({ name: z.string(), email: z.string(), isOver: z.boolean() })),
});
export type AdminTeam = z.infer<typeof adminTeamSchema>;

/** Administrator only; 404 for everybody else, as of every address below /api/admin. */
export const listAllTeams = endpoint({
  method: 'GET',
  path: '/api/admin/teams',
  body: null,
  status: 200,
  answer: z.array(adminTeamSchema).max(500),
});

const daySchema = z.iso.date('Write the day like 2027-04-18.');
const captainSchema = z.object({ name: personNameSchema, email: emailSchema });

/** Opens a team and invites its first captain. */
export const createTeam = endpoint({
  method: 'POST',
  path: '/api/admin/teams',
  body: z
    .object({
      name: personNameSchema,
      university: personNameSchema,
      season: z.object({ from: daySchema, to: daySchema }),
      captain: captainSchema,
    })
    .refine(({ season }) => season.from < season.to, {
      path: ['season', 'to'],
      message: 'The season must end after it begins.',
    }),
  status: 201,
  answer: adminTeamSchema,
});

/** Invites a captain to a team that has none; 409 `has-captain`. */
export const inviteCaptain = endpoint({
  method: 'POST',
  path: '/api/admin/teams/:team/captains',
  body: captainSchema,
  status: 201,
  answer: adminTeamSchema,
});

export const adminPersonSchema = z.object({
  id: z.string(),
  name: z.string(),
  email: z.string(),
  teams: z.array(z.string()),
  isAdministrator: z.boolean(),
  isDisabled: z.boolean(),
});
export type AdminPerson = z.infer<typeof adminPersonSchema>;

export const listAllPeople = endpoint({
  method: 'GET',
  path: '/api/admin/people',
  body: null,
  status: 200,
  answer: z.array(adminPersonSchema).max(2000),
});

/** Locks an account, which ends its sessions and sockets, or opens it again; 409 `oneself`. */
export const changePerson = endpoint({
  method: 'PATCH',
  path: '/api/admin/people/:person',
  body: z.object({ isDisabled: z.boolean() }),
  status: 200,
  answer: adminPersonSchema,
});
