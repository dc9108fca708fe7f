/**
 * Margin notes: written by advisors beside the report, never in it; answered by captain and members; settled by the
 * advisor or the captain.
 */
import { z } from 'zod';
import { noteAnchorSchema, textPlaceSchema } from '#shared/notes/note-anchor.ts';
import { NOTE_STATES } from '#shared/notes/note-states.ts';
import { endpoint, PROBLEM_PATH } from './endpoint.ts';
import { sectionNameSchema } from './teams.ts';

/** Made by the client, so that a note that is sent twice is kept once. */
const noteIdSchema = z.string().regex(/^[a-z0-9-]{8,40}$/);

export const MAX_NOTE = 1000;
const noteTextSchema = z
  .string()
  .trim()
  .min(1, 'Write what you want to say.')
  .max(MAX_NOTE, `Say it in at most ${MAX_NOTE} signs.`);

export const noteReplySchema = z.object({
  id: noteIdSchema,
  text: z.string(),
  by: z.string(),
  at: z.string(),
});
export type NoteReply = z.infer<typeof noteReplySchema>;

export const marginNoteSchema = z.object({
  id: noteIdSchema,
  /** Its raised number in the text; never given to another note. */
  n: z.number().int().positive(),
  section: sectionNameSchema,
  anchor: noteAnchorSchema,
  /** Plain text; so are answers and reasons. */
  text: z.string(),
  by: z.string(),
  at: z.string(),
  state: z.enum(NOTE_STATES),
  /** Who settled it and when; with the team's reason when the text is held to. */
  settled: z.object({ by: z.string(), at: z.string(), reason: z.string() }).nullable(),
  /** Counts how often its place was written anew. */
  revision: z.number().int().nonnegative(),
  answers: z.array(noteReplySchema),
});
export type MarginNote = z.infer<typeof marginNoteSchema>;

/** All notes by number. */
export const listNotes = endpoint({
  method: 'GET',
  path: `${PROBLEM_PATH}/notes`,
  body: null,
  status: 200,
  answer: z.array(marginNoteSchema),
});

/** Advisors only. The same id again is answered with the note that is there; 409 `id-taken` for anybody else's. */
export const writeNote = endpoint({
  method: 'POST',
  path: `${PROBLEM_PATH}/notes`,
  body: z.object({
    id: noteIdSchema,
    section: sectionNameSchema,
    anchor: noteAnchorSchema,
    text: noteTextSchema,
  }),
  status: 201,
  answer: marginNoteSchema,
});

/** Captain and members; 409 `settled` once it is. */
export const answerNote = endpoint({
  method: 'POST',
  path: `${PROBLEM_PATH}/notes/:note/answers`,
  body: z.object({ id: noteIdSchema, text: noteTextSchema }),
  status: 201,
  answer: marginNoteSchema,
});

export const noteChangeSchema = z.discriminatedUnion('kind', [
  z.object({ kind: z.literal('agree') }),
  z.object({
    kind: z.literal('hold to'),
    reason: z
      .string()
      .trim()
      .min(1, 'Say why the text stays as it is.')
      .max(MAX_NOTE, `Say it in at most ${MAX_NOTE} signs.`),
  }),
  z.object({ kind: z.literal('open again') }),
  z.object({ kind: z.literal('place'), place: textPlaceSchema, revision: z.number().int().nonnegative() }),
]);
export type NoteChange = z.infer<typeof noteChangeSchema>;

/**
 * Settles a note or opens it again (advisors and the captain; 409 `settled` when somebody was first), or writes anew
 * where its words stand (captain and members; 409 `changed-meanwhile` on another revision).
 */
export const changeNote = endpoint({
  method: 'PATCH',
  path: `${PROBLEM_PATH}/notes/:note`,
  body: noteChangeSchema,
  status: 200,
  answer: marginNoteSchema,
});
