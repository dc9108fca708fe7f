/** Findings as JSON and back: for the API, and for editions, which keep them frozen. */
import type { Findings } from './findings.ts';

/** Findings as JSON carries them: maps as objects by key, columns as lists, what is not finite as `{ notFinite }`. */
export type FindingsJson = { readonly version: number } & Readonly<Record<string, unknown>>;

const MAPS = ['values', 'sources', 'groups', 'comparisons', 'claims', 'charts'] as const;

/**
 * Findings as JSON can carry them. A number that JSON has no figures for (degrees of freedom without limit, a trial
 * that could not be read) is written as `{ "notFinite": "Infinity" }`, never as nothing: nothing means not known.
 */
export function findingsToJson(findings: Findings): FindingsJson {
  return { ...(toJson(findings) as Record<string, unknown>), version: findings.version };
}

/**
 * The inverse of findingsToJson: maps are maps again, and columns are typed arrays.
 *
 * @param json - made by findingsToJson, and perhaps written and parsed since
 * @throws TypeError when a part of the findings is missing
 */
export function findingsFromJson(json: FindingsJson): Findings {
  const maps = MAPS.map((name) => {
    const part = fromJson(json[name]);
    if (!isRecord(part)) throw new TypeError(`findingsFromJson: needs ${name}, got ${typeof json[name]}`);
    return [name, new Map(Object.entries(part))] as const;
  });
  return { version: json.version, ...Object.fromEntries(maps) } as unknown as Findings;
}

function toJson(value: unknown): unknown {
  if (typeof value === 'number') return Number.isFinite(value) ? value : { notFinite: String(value) };
  if (typeof value !== 'object' || value === null) return value;
  if (value instanceof Float64Array || value instanceof Uint8Array) return Array.from(value, toJson);
  if (Array.isArray(value)) return value.map(toJson);
  const entries = value instanceof Map ? [...value] : Object.entries(value);
  return Object.fromEntries(
    entries.filter(([, part]) => part !== undefined).map(([key, part]) => [String(key), toJson(part)]),
  );
}

function fromJson(value: unknown): unknown {
  if (Array.isArray(value)) return value.map(fromJson);
  if (!isRecord(value)) return value;
  const entries = Object.entries(value);
  // Only a number is written so: no other part of findings is one text under this name.
  if (entries.length === 1 && typeof value.notFinite === 'string') return Number(value.notFinite);
  return withColumns(Object.fromEntries(entries.map(([key, part]) => [key, fromJson(part)])));
}

function isRecord(value: unknown): value is Record<string, unknown> {
  return typeof value === 'object' && value !== null && !Array.isArray(value);
}

/** Gives the lists of a column, and of a chart's curve, their typed arrays back. */
function withColumns(part: Record<string, unknown>): Record<string, unknown> {
  if (part.shape === 'column') {
    const shared = part.shared as readonly { readonly source: string; readonly c: readonly number[] }[];
    return {
      ...part,
      values: toColumn(part.values),
      own: toColumn(part.own),
      shared: shared.map(({ source, c }) => ({ source, c: toColumn(c) })),
      ...(part.apart === undefined ? {} : { apart: toColumn(part.apart) }),
    };
  }
  if (Array.isArray(part.trusted)) {
    return {
      x: toColumn(part.x),
      y: toColumn(part.y),
      u: toColumn(part.u),
      trusted: Uint8Array.from(part.trusted as readonly number[]),
    };
  }
  return part;
}

function toColumn(list: unknown): Float64Array {
  return Float64Array.from(list as readonly number[]);
}
