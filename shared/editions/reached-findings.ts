import type { Evidence } from '#shared/evidence/evidence.ts';
import type { FindingsJson } from '#shared/evidence/findings-json.ts';
import type { Reach } from './reach.ts';

type Json = Readonly<Record<string, unknown>>;

/**
 * Frozen findings of what a report reaches, with the number of trials that all of the edition has.
 *
 * @param findings - as the edition keeps them
 * @param evidence - of the edition
 * @param reach - how far the report reaches
 */
export function reachedFindings(findings: FindingsJson, evidence: Evidence, reach: Reach): Json {
  const values = pick(findings.values, (key) => isReachedValue(key, reach));
  const kept = {
    values,
    groups: pick(findings.groups, (id) => reach.series.has(id)),
    comparisons: pick(findings.comparisons, (id) => reach.comparisons.has(id)),
    claims: pick(findings.claims, (id) => reach.claims.has(id)),
    charts: pick(findings.charts, (id) => reach.charts.has(id)),
  };
  const named = namedSources(kept);
  const sources = pick(
    findings.sources,
    (id) => named.has(id) || [...reach.comparisons].some((comparison) => id.startsWith(`fit:${comparison}:`)),
  );
  return { version: findings.version, ...kept, sources, counts: countsOf(evidence) };
}

/** Keys are `q` and `q@series`. */
function isReachedValue(key: string, reach: Reach): boolean {
  const [quantity = '', series] = key.split('@');
  return reach.valued.has(quantity) && (series === undefined || reach.series.has(series));
}

function pick(part: unknown, isReached: (key: string) => boolean): Json {
  return Object.fromEntries(Object.entries(part as Json).filter(([key]) => isReached(key)));
}

/** Every text under the name `source`, wherever it stands. */
function namedSources(part: unknown, found = new Set<string>()): ReadonlySet<string> {
  if (Array.isArray(part)) part.forEach((one) => namedSources(one, found));
  else if (typeof part === 'object' && part !== null) {
    for (const [name, value] of Object.entries(part)) {
      if (name === 'source' && typeof value === 'string') found.add(value);
      else namedSources(value, found);
    }
  }
  return found;
}

function countsOf({ trials }: Evidence) {
  const standing = trials.filter(({ withdrawn }) => withdrawn === undefined);
  const kept = standing.filter(({ excluded }) => excluded === undefined).length;
  return { trials: standing.length, kept, excluded: standing.length - kept };
}
