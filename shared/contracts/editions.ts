/** Editions: frozen once, never changed. Everybody of the team reads them; the captain freezes. */
import { z } from 'zod';
import { editionComparisonSchema } from '#shared/editions/edition-comparison.ts';
import { frozenEditionSchema } from '#shared/editions/frozen-edition.ts';
import { endpoint, PROBLEM_PATH } from './endpoint.ts';

/** An edition as lists tell of it. */
export const editionSchema = z.object({
  n: z.number().int().positive(),
  at: z.string(),
  /** Name of who froze it. */
  by: z.string(),
  note: z.string(),
  /** SHA-256 in 64 hexadecimal figures, see sealOf. */
  seal: z.string(),
  trials: z.number().int(),
  /** Live values in its report. */
  tiedNumbers: z.number().int(),
  /** Pages and SHA-256 of its PDF; null until it is first asked for, when it could not be printed on freezing. */
  pages: z.number().int().nullable(),
  pdfSha: z.string().nullable(),
});
export type Edition = z.infer<typeof editionSchema>;

/** All of a problem's editions, the newest first. */
export const listEditions = endpoint({
  method: 'GET',
  path: `${PROBLEM_PATH}/editions`,
  body: null,
  status: 200,
  answer: z.array(editionSchema),
});

/**
 * Freezes the draft as it stands. Captain only. `after` is the newest edition the captain has seen, 0 for none:
 * 409 `frozen-meanwhile` when there is a newer one by now.
 */
export const freezeEdition = endpoint({
  method: 'POST',
  path: `${PROBLEM_PATH}/editions`,
  body: z.object({
    note: z.string().trim().max(400, 'Use at most 400 characters.'),
    after: z.number().int().nonnegative(),
  }),
  status: 201,
  answer: editionSchema,
});

/** One edition with all that it keeps. */
export const getEdition = endpoint({
  method: 'GET',
  path: `${PROBLEM_PATH}/editions/:n`,
  body: null,
  status: 200,
  answer: z.object({ edition: editionSchema, content: frozenEditionSchema }),
});

/** Its PDF: the same bytes every time; with `?show` to be shown, else to be saved. */
export const getEditionPdf = endpoint({
  method: 'GET',
  path: `${PROBLEM_PATH}/editions/:n/report.pdf`,
  body: null,
  status: 200,
  answer: null,
});

/** What moved from edition n to `other`: another edition's number, or `draft`. */
export const compareEditions = endpoint({
  method: 'GET',
  path: `${PROBLEM_PATH}/editions/:n/compare/:other`,
  body: null,
  status: 200,
  answer: editionComparisonSchema,
});
