/** Fights and the settings of events. Everybody of the team reads; the captain writes. Changes need If-Match. */
import { z } from 'zod';
import { idSchema } from '#shared/evidence/evidence.ts';
import { eventSchema, stageRoleSchema } from '#shared/talk/event.ts';
import { endpoint } from './endpoint.ts';
import { fightSchema } from './teams.ts';

const TEAM_PATH = '/api/teams/:team';

export const fightInputSchema = z.object({
  name: z.string().trim().min(1, 'Give the fight a name.').max(80, 'Use at most 80 characters.'),
  /** May be past: a fight can be recorded afterwards. */
  at: z.iso.datetime({ offset: true, message: 'Give the day and time of the fight.' }),
  place: z.string().trim().max(120).optional(),
  result: z.string().trim().max(120).optional(),
  event: idSchema.optional(),
  stages: z
    .array(
      z.object({
        role: stageRoleSchema,
        problem: z.number().int().positive(),
        against: z.string().trim().max(80).optional(),
        person: z.string().max(64).optional(),
      }),
    )
    .max(12, 'A fight has at most twelve stages.'),
});
export type FightInput = z.infer<typeof fightInputSchema>;

/** A fight with the version of its row, for If-Match. */
export const keptFightSchema = fightSchema.extend({ rowVersion: z.number().int() });
export type KeptFight = z.infer<typeof keptFightSchema>;

/** A team's event with the version of its row, for If-Match. */
export const keptEventSchema = eventSchema.safeExtend({ id: idSchema, rowVersion: z.number().int() });
export type KeptEvent = z.infer<typeof keptEventSchema>;

/** The earliest first. */
export const listFights = endpoint({
  method: 'GET',
  path: `${TEAM_PATH}/fights`,
  body: null,
  status: 200,
  answer: z.array(keptFightSchema),
});

/** Captain only; 422 `invalid` for a problem, person or event not the team's, or a person too often on stage. */
export const createFight = endpoint({
  method: 'POST',
  path: `${TEAM_PATH}/fights`,
  body: fightInputSchema,
  status: 201,
  answer: keptFightSchema,
});

/** Captain only; needs If-Match; 409 `changed-meanwhile`, else as createFight. */
export const updateFight = endpoint({
  method: 'PUT',
  path: `${TEAM_PATH}/fights/:id`,
  body: fightInputSchema,
  status: 200,
  answer: keptFightSchema,
});

/** Captain only; needs If-Match; 409 `changed-meanwhile`. */
export const removeFight = endpoint({
  method: 'DELETE',
  path: `${TEAM_PATH}/fights/:id`,
  body: null,
  status: 204,
  answer: null,
});

/** The team's events by name. */
export const listEvents = endpoint({
  method: 'GET',
  path: `${TEAM_PATH}/events`,
  body: null,
  status: 200,
  answer: z.array(keptEventSchema),
});

/** Captain only. */
export const createEvent = endpoint({
  method: 'POST',
  path: `${TEAM_PATH}/events`,
  body: eventSchema,
  status: 201,
  answer: keptEventSchema,
});

/** Captain only; needs If-Match; 409 `changed-meanwhile`. */
export const updateEvent = endpoint({
  method: 'PUT',
  path: `${TEAM_PATH}/events/:id`,
  body: eventSchema,
  status: 200,
  answer: keptEventSchema,
});

/** Captain only; needs If-Match; 409 `event-in-use` while a fight is held by it. */
export const removeEvent = endpoint({
  method: 'DELETE',
  path: `${TEAM_PATH}/events/:id`,
  body: null,
  status: 204,
  answer: null,
});
