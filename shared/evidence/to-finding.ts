import { at } from '#shared/numeric/element.ts';
import {
  combinedDegreesOfFreedom,
  type SourceFreedom,
} from '#shared/uncertainty/combined-degrees-of-freedom.ts';
import { standardUncertainty } from '#shared/uncertainty/standard-uncertainty.ts';
import type { Column, MadeOf, Part, Scalar } from './findings.ts';
import { partsOfRow, rootSumOfSquares, rowOf, type Uncertain } from './uncertain.ts';

/** What a finding is, besides its numbers. */
export interface FindingLabels {
  readonly unit: string;
  readonly madeOf: MadeOf;
  readonly warnings: readonly string[];
  readonly freedomOf: (source: string) => SourceFreedom;
}

/** One value as a finding. */
export function toScalar(uncertain: Uncertain, labels: FindingLabels): Scalar {
  return scalarOf(
    {
      value: at(uncertain.values, 0),
      parts: partsOfRow(uncertain.terms, 0, (source) => source),
      known: uncertain.known,
      hue: uncertain.hue,
    },
    labels,
  );
}

/** A finding from a value and its parts. Where a derivative is infinite there is no first-order uncertainty. */
export function scalarOf(
  { value, parts, known, hue }: { value: number; parts: readonly Part[]; known: boolean; hue: Scalar['hue'] },
  { unit, madeOf, warnings, freedomOf }: FindingLabels,
): Scalar {
  const usable = parts.every(({ c }) => Number.isFinite(c));
  const used = usable ? parts : [];
  return {
    shape: 'scalar',
    value,
    u: known && usable ? standardUncertainty(used) : null,
    parts: used,
    degreesOfFreedom: combinedDegreesOfFreedom(used, freedomOf),
    unit,
    hue,
    madeOf,
    warnings: usable ? warnings : [...warnings, 'Its uncertainty cannot be had to first order here.'],
  };
}

/** A column as a finding: what is own to its rows as one uncertainty, what is common as sensitivities. */
export function toColumn(
  uncertain: Uncertain,
  trials: readonly string[],
  unit: string,
  warnings: readonly string[],
): Column {
  const n = trials.length;
  const fill = (c: Float64Array): Float64Array =>
    c.length === n ? c : new Float64Array(n).fill(rowOf(c, 0));
  const apart = rootSumOfSquares(
    uncertain.terms.filter(({ kind }) => kind === 'apart'),
    n,
  );
  const own = rootSumOfSquares(
    uncertain.terms.filter(({ kind }) => kind !== 'shared'),
    n,
  );
  return {
    shape: 'column',
    trials,
    values: fill(uncertain.values),
    own: own ?? new Float64Array(n),
    shared: uncertain.terms
      .filter(({ kind }) => kind === 'shared')
      .map(({ source, c }) => ({ source, c: fill(c) })),
    ...(apart === null ? {} : { apart }),
    unit,
    hue: uncertain.hue,
    warnings,
  };
}
