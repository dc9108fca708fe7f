/**
 * Copies of editions lent to opponents and reviewers. The team sees what is out and what is lent to it; a reader needs
 * no account, only the address with its token. Every refusal of a token is one and the same 404.
 */
import { z } from 'zod';
import { copyViewSchema } from '#shared/editions/copy-view.ts';
import { idSchema } from '#shared/evidence/evidence.ts';
import { endpoint, PROBLEM_PATH } from './endpoint.ts';

const momentSchema = z.iso.datetime({ offset: true });

/** What the reader does with the copy in the fight. */
export const copyReaderSchema = z.enum(['opponent', 'reviewer']);
export type CopyReader = z.infer<typeof copyReaderSchema>;

/** How it stands with a copy now. */
export const copyStandingSchema = z.enum(['waiting', 'open', 'ended', 'taken back']);
export type CopyStanding = z.infer<typeof copyStandingSchema>;

const lentEditionSchema = z.object({
  problem: z.object({ number: z.number().int(), title: z.string() }),
  edition: z.object({ n: z.number().int(), seal: z.string(), at: z.string() }),
  reader: copyReaderSchema,
  from: z.string(),
  until: z.string(),
  standing: copyStandingSchema,
  takenBackAt: z.string().nullable(),
});

/** A copy of ours that is out, or was. */
export const copySchema = lentEditionSchema.extend({
  id: idSchema,
  /** Within the problem; printed on every page. */
  number: z.number().int().positive(),
  recipient: z.string(),
  hasPassphrase: z.boolean(),
  mayPrint: z.boolean(),
  lentAt: z.string(),
  lentBy: z.string(),
  views: z.object({
    opened: z.number().int(),
    printed: z.number().int(),
    firstAt: z.string().nullable(),
    lastAt: z.string().nullable(),
  }),
});
export type Copy = z.infer<typeof copySchema>;

/** A copy that another team of this installation has lent to ours; it opens by the address they gave us. */
export const borrowedCopySchema = lentEditionSchema.extend({ id: idSchema, team: z.string() });
export type BorrowedCopy = z.infer<typeof borrowedCopySchema>;

export const MAX_COPIES = 500;

/** Copies of this problem's editions, the newest first. */
export const listProblemCopies = endpoint({
  method: 'GET',
  path: `${PROBLEM_PATH}/copies`,
  body: null,
  status: 200,
  answer: z.array(copySchema).max(MAX_COPIES),
});

/** What is out, of all problems, and what is lent to us. */
export const listTeamCopies = endpoint({
  method: 'GET',
  path: '/api/teams/:team/copies',
  body: null,
  status: 200,
  answer: z.object({
    lent: z.array(copySchema).max(MAX_COPIES),
    borrowed: z.array(borrowedCopySchema).max(MAX_COPIES),
  }),
});

export const MIN_COPY_PASSPHRASE_LENGTH = 8;

export const lendSchema = z.object({
  recipient: z.string().trim().min(1, 'Say to whom it is lent, like Gannet Bank.').max(80),
  reader: copyReaderSchema,
  from: momentSchema,
  until: momentSchema,
  /** Asked of the reader besides the address; null: the address is enough. */
  passphrase: z
    .string()
    .min(MIN_COPY_PASSPHRASE_LENGTH, `Use at least ${MIN_COPY_PASSPHRASE_LENGTH} characters.`)
    .max(200)
    .nullable(),
  mayPrint: z.boolean(),
});

/** Lends an edition; captain only. The token is told this once: only its hash is kept. 422 when it ends before it begins. */
export const lendCopy = endpoint({
  method: 'POST',
  path: `${PROBLEM_PATH}/editions/:n/copies`,
  body: lendSchema,
  status: 201,
  answer: z.object({ copy: copySchema, token: z.string() }),
});

/** Takes a copy back, or changes how long it is open; captain only. 409 `taken-back` when it was taken back before. */
export const changeCopy = endpoint({
  method: 'PATCH',
  path: `${PROBLEM_PATH}/copies/:copy`,
  body: z.object({ until: momentSchema.optional(), takenBack: z.literal(true).optional() }),
  status: 200,
  answer: copySchema,
});

/** What a reader has before them. */
export const openCopySchema = z.object({
  number: z.number().int(),
  recipient: z.string(),
  reader: copyReaderSchema,
  until: z.string(),
  mayPrint: z.boolean(),
  /** False for the team that lent it, whose people see no questions. */
  mayAsk: z.boolean(),
  view: copyViewSchema,
});
export type OpenCopy = z.infer<typeof openCopySchema>;

/** The very view that the reader gets; captain only, and never with questions. */
export const previewCopy = endpoint({
  method: 'GET',
  path: `${PROBLEM_PATH}/copies/:copy/preview`,
  body: null,
  status: 200,
  answer: openCopySchema,
});

export const COPY_PATH = '/api/copies/:token';

/** Opens a copy and logs that it was opened. 403 `passphrase-needed`. */
export const openCopy = endpoint({
  method: 'GET',
  path: COPY_PATH,
  body: null,
  status: 200,
  answer: openCopySchema,
});

/** Answers the passphrase; a cookie for this copy alone remembers it for some hours. 422 `wrong-passphrase`. */
export const passCopy = endpoint({
  method: 'POST',
  path: `${COPY_PATH}/opening`,
  body: z.object({
    passphrase: z.string().min(1, 'Write the passphrase that came with the address.').max(200),
  }),
  status: 204,
  answer: null,
});

/** Whether it is still open; an open page asks now and then. Logs nothing. */
export const getCopyStanding = endpoint({
  method: 'GET',
  path: `${COPY_PATH}/standing`,
  body: null,
  status: 200,
  answer: z.object({ until: z.string() }),
});

/** A picture of the report. */
export const getCopyFile = endpoint({
  method: 'GET',
  path: `${COPY_PATH}/files/:sha`,
  body: null,
  status: 200,
  answer: null,
});

/** The report as PDF, with recipient and number on every page. 403 `not-for-print` where the lender did not allow it. */
export const getCopyPdf = endpoint({
  method: 'GET',
  path: `${COPY_PATH}/report.pdf`,
  body: null,
  status: 200,
  answer: null,
});
