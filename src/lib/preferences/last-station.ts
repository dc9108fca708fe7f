import { STATIONS, type Station } from '#src/lib/paths.ts';
import type { ProblemAddress } from '#src/lib/problem/problem-address.ts';
import { keep, recall } from './preference.ts';

function nameOf({ team, number }: ProblemAddress): string {
  return `station:${team}/${number}`;
}

/** A problem opens at the station last used in this browser, and the first time at Trials. */
export function lastStation(address: ProblemAddress): Station {
  const kept = recall(nameOf(address));
  return STATIONS.find((station) => station === kept) ?? 'trials';
}

export function keepLastStation(address: ProblemAddress, station: Station): void {
  keep(nameOf(address), station);
}
