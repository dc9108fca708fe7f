import type { ProblemSettings } from '#shared/evidence/evidence.ts';
import { formatBare } from '#shared/formatting/format-scalar.ts';

/** "46.4 ± 0.4", for a column that has the unit in its head. */
export function bareScalar(
  { value, u }: { readonly value: number; readonly u: number | null },
  unit: string,
  rounding: ProblemSettings['rounding'],
): string {
  const figures = formatBare({ value, u }, unit, rounding);
  return u === null || u === 0
    ? figures
    : `${figures}\u00a0±\u00a0${formatBare({ value: u, u }, unit, rounding)}`;
}
