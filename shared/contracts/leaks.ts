/** Where an opponent will press, and what the team says to it. Everybody of the team reads; captain and members answer. */
import { z } from 'zod';
import { endpoint, PROBLEM_PATH } from './endpoint.ts';
import { sectionNameSchema } from './teams.ts';

const leakNameSchema = z.enum([
  'Left unexplained',
  'A claim without trials',
  'Named, not measured',
  'Outside trust',
  'Excluded trial',
  'Taken, not measured',
  'Not tied',
  'A condition not checked',
  'Few repeats',
]);

/** A leak as scripts read it; screens compute leaks themselves, with the same code. */
export const leakSchema = z.object({
  id: z.string(),
  name: leakNameSchema,
  force: z.enum(['trickle', 'jet', 'burst']),
  section: sectionNameSchema,
  question: z.string(),
  evidence: z.string(),
  mend: z.string(),
});

export const leakAnswerSchema = z.object({
  leak: z.string(),
  text: z.string(),
  by: z.string(),
  at: z.string(),
  basis: z.string(),
});

export const leakMarkSchema = z.object({
  leak: z.string(),
  name: leakNameSchema,
  section: sectionNameSchema,
  question: z.string(),
  evidence: z.string(),
});

export const leaksStateSchema = z.object({
  /** The hardest first. */
  leaks: z.array(leakSchema),
  answers: z.array(leakAnswerSchema),
  /** Every leak that was ever found, as it was last. */
  marks: z.array(leakMarkSchema),
});
export type LeaksState = z.infer<typeof leaksStateSchema>;

/** Leaks of the draft as it stands, the answers to them, and what was found before. */
export const getLeaks = endpoint({
  method: 'GET',
  path: `${PROBLEM_PATH}/leaks`,
  body: null,
  status: 200,
  answer: leaksStateSchema,
});

export const MAX_LEAK_ANSWER = 600;

/**
 * Prepares an answer, changes it, or takes it away (empty text). `after` is the moment of the answer that was seen, null
 * for none: 409 `changed-meanwhile` when there is a newer one; 404 when no such leak is found any more.
 */
export const answerLeak = endpoint({
  method: 'PUT',
  path: `${PROBLEM_PATH}/leaks/:leak/answer`,
  body: z.object({
    text: z
      .string()
      .trim()
      .max(MAX_LEAK_ANSWER, `Say it in at most ${MAX_LEAK_ANSWER} signs: it is said aloud.`),
    after: z.string().nullable(),
  }),
  status: 200,
  answer: z.object({ answer: leakAnswerSchema.nullable() }),
});
