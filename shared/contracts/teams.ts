/** A team and its season. Any member of the team may read; only the captain changes. */
import { z } from 'zod';
import { problemSettingsSchema, idSchema } from '#shared/evidence/evidence.ts';
import { endpoint, PROBLEM_PATH } from './endpoint.ts';
import { roleSchema } from './session.ts';

export const personSchema = z.object({ id: z.string(), name: z.string(), role: roleSchema });
export type Person = z.infer<typeof personSchema>;

/** Level of a report's section; always computed, never set. */
export const levelSchema = z.enum(['Blank', 'Sketched', 'Drafted', 'Tied', 'Held']);
export type Level = z.infer<typeof levelSchema>;

export const sectionNameSchema = z.enum(['Phenomenon', 'Model', 'Experiment', 'Comparison', 'Conclusion']);
export type SectionName = z.infer<typeof sectionNameSchema>;

export const taskSchema = z.object({
  id: idSchema,
  /** A verb of the task, as the statement asks: "How far can its jet reach?" */
  text: z.string().min(1).max(400),
});
export type Task = z.infer<typeof taskSchema>;

export const problemSummarySchema = z.object({
  number: z.number().int().positive(),
  title: z.string(),
  statement: z.string(),
  owners: z.array(personSchema),
  /** What the team does with it in the next fight, if anything. */
  stage: z.enum(['report', 'oppose', 'review']).nullable(),
  levels: z.array(z.object({ section: sectionNameSchema, level: levelSchema })).length(5),
  claims: z.object({ holds: z.number().int(), leaks: z.number().int(), undecided: z.number().int() }),
  trials: z.number().int(),
  /** Numbers in the report that are typed, not tied. */
  notTied: z.number().int(),
});
export type ProblemSummary = z.infer<typeof problemSummarySchema>;

export const fightSchema = z.object({
  id: idSchema,
  name: z.string(),
  at: z.string(),
  place: z.string().optional(),
  /** Result in words, once it is over. */
  result: z.string().optional(),
  /** The team's event by whose settings it is held. */
  event: idSchema.optional(),
  stages: z.array(
    z.object({
      role: z.enum(['report', 'oppose', 'review']),
      problem: z.number().int(),
      against: z.string().optional(),
      /** Id of who takes the stage. */
      person: z.string().optional(),
    }),
  ),
});
export type Fight = z.infer<typeof fightSchema>;

export const teamSchema = z.object({
  slug: z.string(),
  name: z.string(),
  university: z.string(),
  /** Invented for demonstration: said wherever the team is shown. */
  isDemo: z.boolean(),
  people: z.array(personSchema),
  season: z.object({ from: z.string(), to: z.string() }),
  fights: z.array(fightSchema),
});
export type Team = z.infer<typeof teamSchema>;

export const getTeam = endpoint({
  method: 'GET',
  path: '/api/teams/:team',
  body: null,
  status: 200,
  answer: teamSchema,
});

export const listProblems = endpoint({
  method: 'GET',
  path: '/api/teams/:team/problems',
  body: null,
  status: 200,
  answer: z.array(problemSummarySchema).max(100),
});

export const newProblemSchema = z.object({
  number: z.number().int('Use a whole number.').min(1, 'Numbers begin at 1.').max(999),
  title: z.string().trim().min(1, 'Give the problem its short name.').max(80),
  statement: z.string().trim().min(1, 'Paste the task as it was set.').max(4000),
  /** The verbs of the task, each a question that the report must answer; each becomes a claim without a test. */
  tasks: z.array(z.string().trim().min(1).max(400)).max(12),
  owners: z.array(z.string()).max(12),
});

/** Captain and members; 409 `number-taken`. */
export const createProblem = endpoint({
  method: 'POST',
  path: '/api/teams/:team/problems',
  body: newProblemSchema,
  status: 201,
  answer: z.object({ number: z.number().int() }),
});

export const problemSchema = z.object({
  number: z.number().int(),
  title: z.string(),
  statement: z.string(),
  tasks: z.array(taskSchema),
  owners: z.array(personSchema),
  settings: problemSettingsSchema,
  /** Version of this row, for If-Match. */
  rowVersion: z.number().int(),
});
export type Problem = z.infer<typeof problemSchema>;

export const getProblem = endpoint({
  method: 'GET',
  path: PROBLEM_PATH,
  body: null,
  status: 200,
  answer: problemSchema,
});

/** Captain and members; needs If-Match; 409 `changed-meanwhile`. Settings are evidence, so they raise its version. */
export const updateProblem = endpoint({
  method: 'PATCH',
  path: PROBLEM_PATH,
  body: z.object({
    title: z.string().trim().min(1, 'Give the problem its short name.').max(80).optional(),
    statement: z.string().trim().min(1, 'Paste the task as it was set.').max(4000).optional(),
    tasks: z.array(taskSchema).max(12).optional(),
    owners: z.array(z.string()).max(12).optional(),
    settings: problemSettingsSchema.partial().optional(),
  }),
  status: 200,
  answer: problemSchema,
});

/** Captain only; 404 for who is not of the team, 409 `last-captain`. Open sockets of that person end. */
export const changeRole = endpoint({
  method: 'PATCH',
  path: '/api/teams/:team/members/:person',
  body: z.object({ role: roleSchema }),
  status: 200,
  answer: personSchema,
});
