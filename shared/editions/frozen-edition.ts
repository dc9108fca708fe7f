/** What an edition keeps: everything its report is printed from, compared by and lent as, with no way back to the draft. */
import { z } from 'zod';
import { evidenceSchema } from '#shared/evidence/evidence.ts';
import type { FindingsJson } from '#shared/evidence/findings-json.ts';
import type { ReportDocument } from '#shared/report/schema/report-node.ts';

/** Form of frozen editions that is written now. Those of an earlier form stay readable as they are. */
export const EDITION_SCHEMA_VERSION = 1;

const roleSchema = z.enum(['captain', 'member', 'advisor']);

/** A person as an edition names them: no id and no address leaves with it. */
export const namedPersonSchema = z.object({ name: z.string(), role: roleSchema });
/** A person of a frozen edition. */
export type NamedPerson = z.infer<typeof namedPersonSchema>;

/** A picture of the report, by its fingerprint. */
export const frozenFileSchema = z.object({
  sha: z.string().regex(/^[0-9a-f]{64}$/),
  width: z.number().int(),
  height: z.number().int(),
  bytes: z.number().int(),
});
/** A picture that a frozen report shows. */
export type FrozenFile = z.infer<typeof frozenFileSchema>;

/** The content of an edition. The document was checked against the report's schema when it was frozen. */
export const frozenEditionSchema = z.object({
  schemaVersion: z.number().int().positive(),
  /** Version of the report's schema that the document follows. */
  reportSchema: z.number().int().positive(),
  problem: z.object({
    number: z.number().int(),
    title: z.string(),
    statement: z.string(),
    tasks: z.array(z.object({ id: z.string(), text: z.string() })),
    owners: z.array(namedPersonSchema),
  }),
  team: z.object({
    name: z.string(),
    university: z.string(),
    isDemo: z.boolean(),
    people: z.array(namedPersonSchema),
  }),
  evidence: evidenceSchema,
  document: z.custom<ReportDocument>(
    (json) => typeof json === 'object' && json !== null && 'type' in json && json.type === 'doc',
  ),
  /** See findingsToJson; they are never computed again. */
  findings: z.custom<FindingsJson>(
    (json) => typeof json === 'object' && json !== null && 'version' in json && 'values' in json,
  ),
  /** Pictures of the report, in the order of their fingerprints. */
  files: z.array(frozenFileSchema),
  /** When it was frozen, ISO 8601. */
  at: z.string(),
});
/** The content of an edition. */
export type FrozenEdition = z.infer<typeof frozenEditionSchema>;
