import { REPORT_SCHEMA_VERSION } from './report-schema-version.ts';

const TOKEN = /^schema:([1-9]\d{0,5})$/;

/**
 * What a client says when it opens a document on the co-editing socket: the schema version it was built with.
 *
 * @example schemaToken() // => 'schema:1'
 */
export function schemaToken(): string {
  return `schema:${REPORT_SCHEMA_VERSION}`;
}

/**
 * The schema version that a client said, or null when it said none that can be read.
 *
 * @param token - what the client sent
 * @example schemaVersionOf('schema:7') // => 7
 * @example schemaVersionOf('hello') // => null
 */
export function schemaVersionOf(token: string): number | null {
  const match = TOKEN.exec(token);
  return match?.[1] === undefined ? null : Number(match[1]);
}
