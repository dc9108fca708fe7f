import type { Findings } from '#shared/evidence/findings.ts';

/** Findings as JSON can carry them: maps as objects by key, columns as lists, what is not finite as null. */
export function findingsToJson(findings: Findings): { version: number } & Record<string, unknown> {
  return { ...(toJson(findings) as Record<string, unknown>), version: findings.version };
}

function toJson(value: unknown): unknown {
  if (typeof value === 'number') return Number.isFinite(value) ? value : null;
  if (typeof value !== 'object' || value === null) return value;
  if (value instanceof Float64Array || value instanceof Uint8Array) return Array.from(value, toJson);
  if (Array.isArray(value)) return value.map(toJson);
  const entries = value instanceof Map ? [...value] : Object.entries(value);
  return Object.fromEntries(entries.map(([key, part]) => [String(key), toJson(part)]));
}
