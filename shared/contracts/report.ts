/** The report's document, its plates and its PDF. The text itself travels on the co-editing socket. */
import { z } from 'zod';
import { endpoint, PROBLEM_PATH } from './endpoint.ts';

/** The document as ProseMirror JSON with its schema version; any reader of the problem. */
export const getReport = endpoint({
  method: 'GET',
  path: `${PROBLEM_PATH}/report`,
  body: null,
  status: 200,
  answer: z.object({ schemaVersion: z.number().int(), lineage: z.string(), document: z.unknown() }),
});

export const plateFileSchema = z.object({
  sha: z.string().regex(/^[0-9a-f]{64}$/),
  width: z.number().int(),
  height: z.number().int(),
  bytes: z.number().int(),
});
export type PlateFile = z.infer<typeof plateFileSchema>;

export const MAX_UPLOAD_BYTES = 12 * 1024 * 1024;

/** multipart/form-data, field `file`; re-encoded as JPEG, at most 1600 px; 415 `not-a-picture`, 413 `too-large`. */
export const uploadPlate = endpoint({
  method: 'POST',
  path: `${PROBLEM_PATH}/files`,
  body: null,
  status: 201,
  answer: plateFileSchema,
});

/** The bytes; immutable. */
export const getFile = endpoint({
  method: 'GET',
  path: `${PROBLEM_PATH}/files/:sha`,
  body: null,
  status: 200,
  answer: null,
});

/** Starts an export in a worker thread and answers at once. */
export const startExport = endpoint({
  method: 'POST',
  path: `${PROBLEM_PATH}/exports`,
  body: z.object({ kind: z.literal('report.pdf') }),
  status: 201,
  answer: z.object({ id: z.string() }),
});

export const exportStateSchema = z.object({
  id: z.string(),
  state: z.enum(['working', 'done', 'failed', 'cancelled']),
  /** Share done, 0 to 1, and what it is at, in words. */
  share: z.number(),
  at: z.string(),
  sentence: z.string().optional(),
});
export type ExportState = z.infer<typeof exportStateSchema>;

export const getExport = endpoint({
  method: 'GET',
  path: `${PROBLEM_PATH}/exports/:export`,
  body: null,
  status: 200,
  answer: exportStateSchema,
});

/** Stops it. */
export const cancelExport = endpoint({
  method: 'DELETE',
  path: `${PROBLEM_PATH}/exports/:export`,
  body: null,
  status: 204,
  answer: null,
});

/** The file of a finished export, as an attachment. */
export const getExportFile = endpoint({
  method: 'GET',
  path: `${PROBLEM_PATH}/exports/:export/file`,
  body: null,
  status: 200,
  answer: null,
});

/** The same PDF in one request, for scripts. */
export const getReportPdf = endpoint({
  method: 'GET',
  path: `${PROBLEM_PATH}/report.pdf`,
  body: null,
  status: 200,
  answer: null,
});
