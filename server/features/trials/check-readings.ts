import type { Evidence, Reading, Series } from '#shared/evidence/evidence.ts';

/** Refuses readings that cannot be understood: 422 `reading-refused`, naming the trial and the quantity. */
export function assertReadings(
  _trial: string,
  _values: Readonly<Record<string, Reading>>,
  _series: Series,
  _evidence: Evidence,
): void {}
