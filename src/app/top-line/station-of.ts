import { STATIONS, type Station } from '#src/lib/paths.ts';

/** The station that an address inside a problem belongs to; null for its settings. */
export function stationOf(pathname: string): Station | null {
  const name = /^\/team\/[^/]+\/problem\/[^/]+\/([^/]+)/.exec(pathname)?.[1];
  return STATIONS.find((station) => station === name) ?? null;
}
