import type { Evidence } from '#shared/evidence/evidence.ts';
import { parseExpression } from '#shared/expressions/parse-expression.ts';
import type { Fields } from './fields.ts';

/** The expression by id, as it is stored; the text itself when it was refused. Symbols and ids are both understood. */
export function checkExpression(text: string, evidence: Evidence, path: string, fields: Fields): string {
  const parsed = parseExpression(text, evidence.quantities);
  if (parsed.ok) return parsed.expression.stored;
  fields.refuse(path, parsed.fault.sentence);
  return text;
}
