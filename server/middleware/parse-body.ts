import type { z } from 'zod';
import { invalid } from '#server/errors/refusals.ts';

/** The body as its schema has it, or 422 `invalid` with a sentence for each field. */
export function parseBody(schema: z.ZodType | null, body: unknown): unknown {
  if (schema === null) return undefined;
  const parsed = schema.safeParse(body ?? {});
  if (parsed.success) return parsed.data;
  const fields: Record<string, string> = {};
  for (const issue of parsed.error.issues) {
    const path = issue.path.map(String).join('.');
    fields[path] ??= issue.message;
  }
  throw invalid(fields);
}
