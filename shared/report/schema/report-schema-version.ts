/**
 * Version of the report's document schema. It grows whenever a node or an attribute is added, removed or read
 * differently: an editor that does not know a node deletes it for everybody, so the co-editing server lets in only
 * clients that say this very version.
 *
 * @example REPORT_SCHEMA_VERSION // => 1
 */
export const REPORT_SCHEMA_VERSION = 1;
