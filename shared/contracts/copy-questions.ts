/**
 * The questions that a copy's readers prepare. They stand in a room of their own, whose key the first opener sets; the
 * team that lent the copy gets a 404 by every one of these routes.
 */
import { z } from 'zod';
import { idSchema } from '#shared/evidence/evidence.ts';
import { COPY_PATH } from './copies.ts';
import { endpoint } from './endpoint.ts';

export const MIN_ROOM_KEY_LENGTH = 8;
export const MAX_QUESTIONS = 40;
/** Longest excerpt that a question keeps of the report. */
export const MAX_QUOTE_LENGTH = 120;

/** What a question is about: a passage of the report, one of its numbered parts, or a section. */
export const questionAboutSchema = z.discriminatedUnion('kind', [
  z.object({
    kind: z.literal('passage'),
    /** Positions in the frozen document, which never changes. */
    from: z.number().int().nonnegative(),
    to: z.number().int().positive(),
    quote: z.string().max(MAX_QUOTE_LENGTH),
  }),
  z.object({
    kind: z.literal('part'),
    /** Anchor of a block, or the number of a section. */
    anchor: z.string().max(64),
    /** "formula 2", "Comparison". */
    words: z.string().max(60),
  }),
]);
export type QuestionAbout = z.infer<typeof questionAboutSchema>;

const textSchema = z.string().trim().min(1, 'Write the question.').max(400);
const secondsSchema = z.number().int().min(5).max(900);

export const questionSchema = z.object({
  id: idSchema,
  text: z.string(),
  about: questionAboutSchema.nullable(),
  /** Time it may take. */
  seconds: z.number().int(),
});
export type Question = z.infer<typeof questionSchema>;

/** In the order in which they are to be asked. */
export const questionsSchema = z.object({
  /** Time allowed for all of them. */
  seconds: z.number().int(),
  questions: z.array(questionSchema).max(MAX_QUESTIONS),
});
export type Questions = z.infer<typeof questionsSchema>;

const ROOM_PATH = `${COPY_PATH}/room`;
const QUESTIONS_PATH = `${COPY_PATH}/questions`;

/** Whether somebody has set a key, and whether this browser has shown it. */
export const getRoom = endpoint({
  method: 'GET',
  path: ROOM_PATH,
  body: null,
  status: 200,
  answer: z.object({ keySetAt: z.string().nullable(), isOpen: z.boolean() }),
});

/**
 * Sets the key when there is none yet, otherwise shows it; a cookie for this copy alone remembers it. 422 `wrong-key`.
 * With the right key a room opens for reading also after its copy has closed.
 */
export const enterRoom = endpoint({
  method: 'POST',
  path: ROOM_PATH,
  body: z.object({
    key: z.string().min(MIN_ROOM_KEY_LENGTH, `Use at least ${MIN_ROOM_KEY_LENGTH} characters.`).max(200),
  }),
  status: 204,
  answer: null,
});

/** Changes the time allowed. */
export const changeRoom = endpoint({
  method: 'PATCH',
  path: ROOM_PATH,
  body: z.object({ seconds: z.number().int().min(15).max(3600) }),
  status: 200,
  answer: questionsSchema,
});

/** 403 `key-needed` while the copy is open; 404 after it has closed, without the key. */
export const listQuestions = endpoint({
  method: 'GET',
  path: QUESTIONS_PATH,
  body: null,
  status: 200,
  answer: questionsSchema,
});

/** 409 `too-many-questions`. */
export const addQuestion = endpoint({
  method: 'POST',
  path: QUESTIONS_PATH,
  body: z.object({ text: textSchema, about: questionAboutSchema.nullable(), seconds: secondsSchema }),
  status: 201,
  answer: questionsSchema,
});

/** `place` is the place it moves to in the order, from 0. */
export const changeQuestion = endpoint({
  method: 'PATCH',
  path: `${QUESTIONS_PATH}/:question`,
  body: z.object({
    text: textSchema.optional(),
    about: questionAboutSchema.nullable().optional(),
    seconds: secondsSchema.optional(),
    place: z.number().int().min(0).max(MAX_QUESTIONS).optional(),
  }),
  status: 200,
  answer: questionsSchema,
});

export const removeQuestion = endpoint({
  method: 'DELETE',
  path: `${QUESTIONS_PATH}/:question`,
  body: null,
  status: 200,
  answer: questionsSchema,
});
