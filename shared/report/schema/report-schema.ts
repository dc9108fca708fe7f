import { getSchema } from '@tiptap/core';
import type { Schema } from '@tiptap/pm/model';
import { reportExtensions } from './report-extensions.ts';

let schema: Schema | null = null;

/**
 * The ProseMirror schema of a report, made once. Needs no DOM.
 *
 * @example reportSchema().topNodeType.name // => 'doc'
 */
export function reportSchema(): Schema {
  schema ??= getSchema(reportExtensions());
  return schema;
}
