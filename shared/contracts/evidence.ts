/** Reading and writing a problem's evidence. Captain and members write; advisors read. */
import { z } from 'zod';
import {
  chartSchema,
  claimSchema,
  comparisonSchema,
  evidenceSchema,
  idSchema,
  instrumentSchema,
  modelSchema,
  quantitySchema,
  readingSchema,
  seriesSchema,
} from '#shared/evidence/evidence.ts';
import { endpoint, PROBLEM_PATH } from './endpoint.ts';
import { evidenceStepSchema } from './evidence-changes.ts';

const mutationId = z.string().min(1).max(64);

/** ETag is the version; 304 when If-None-Match has it. `rowVersions` are for If-Match on definitions, by row id. */
export const getEvidence = endpoint({
  method: 'GET',
  path: `${PROBLEM_PATH}/evidence`,
  body: null,
  status: 200,
  answer: z.object({ evidence: evidenceSchema, rowVersions: z.record(z.string(), z.number().int()) }),
});

/**
 * Every number, curve and verdict, computed by the server with the code that the screens use; for scripts. Maps come as
 * objects by key, columns as lists; what is not finite is { notFinite: "Infinity" }, so that null means not known.
 */
export const getFindings = endpoint({
  method: 'GET',
  path: `${PROBLEM_PATH}/findings`,
  body: null,
  status: 200,
  answer: z.looseObject({ version: z.number().int() }),
});

/** A trial as a client sends it: its id is made by the client, so that sending it twice logs it once. */
export const newTrialSchema = z.object({
  id: idSchema,
  values: z.record(idSchema, readingSchema),
  note: z.string().max(1000).optional(),
  at: z.iso.datetime({ offset: true }).optional(),
});
export type NewTrial = z.infer<typeof newTrialSchema>;

/** Logs trials, at most 500 at once, all or none: one version step. 422 `reading-refused` names the trial and the quantity. */
export const logTrials = endpoint({
  method: 'POST',
  path: `${PROBLEM_PATH}/series/:series/trials`,
  body: z.object({ mutationId, trials: z.array(newTrialSchema).min(1).max(500) }),
  status: 201,
  answer: evidenceStepSchema,
});

/** Corrects a reading, excludes, brings back or withdraws one trial. */
export const changeTrial = endpoint({
  method: 'PATCH',
  path: `${PROBLEM_PATH}/trials/:trial`,
  body: z.object({
    mutationId,
    change: z.discriminatedUnion('kind', [
      z.object({
        kind: z.literal('correct'),
        values: z.record(idSchema, readingSchema),
        note: z.string().max(1000).optional(),
      }),
      z.object({
        kind: z.literal('exclude'),
        reason: z.string().trim().min(1, 'Say why it is left out.').max(400),
      }),
      z.object({ kind: z.literal('bring back') }),
      z.object({ kind: z.literal('withdraw') }),
    ]),
  }),
  status: 200,
  answer: evidenceStepSchema,
});

/**
 * The definitions: POST makes one (the server gives the id, and n or letter), PUT replaces it whole (needs If-Match;
 * 409 `changed-meanwhile`), DELETE removes it (409 `still-used` names what uses it).
 */
const draft = { id: true } as const;
export const instrumentBody = instrumentSchema.omit(draft);
export const quantityBody = quantitySchema.omit(draft);
export const seriesBody = seriesSchema.omit({ id: true, letter: true });
export const modelBody = modelSchema.omit({ id: true, n: true, at: true, by: true });
export const comparisonBody = comparisonSchema.omit(draft);
export const claimBody = claimSchema.omit({ id: true, n: true, declaredAt: true });
export const chartBody = chartSchema.omit({ id: true, n: true });

function definitionEndpoints<Table extends string, Body extends z.ZodType>(table: Table, row: Body) {
  const answer = evidenceStepSchema.extend({ id: z.string(), rowVersion: z.number().int() });
  return {
    table,
    create: endpoint({
      method: 'POST',
      path: `${PROBLEM_PATH}/${table}`,
      body: z.object({ mutationId, row }),
      status: 201,
      answer,
    }),
    replace: endpoint({
      method: 'PUT',
      path: `${PROBLEM_PATH}/${table}/:id`,
      body: z.object({ mutationId, row }),
      status: 200,
      answer,
    }),
    remove: endpoint({
      method: 'DELETE',
      path: `${PROBLEM_PATH}/${table}/:id`,
      body: z.object({ mutationId }),
      status: 200,
      answer: evidenceStepSchema,
    }),
  };
}

export const definitions = {
  instruments: definitionEndpoints('instruments', instrumentBody),
  quantities: definitionEndpoints('quantities', quantityBody),
  series: definitionEndpoints('series', seriesBody),
  models: definitionEndpoints('models', modelBody),
  comparisons: definitionEndpoints('comparisons', comparisonBody),
  claims: definitionEndpoints('claims', claimBody),
  charts: definitionEndpoints('charts', chartBody),
} as const;
export type DefinitionTable = keyof typeof definitions;
