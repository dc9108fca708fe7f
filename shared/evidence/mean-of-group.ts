import { at, item } from '#shared/numeric/element.ts';
import {
  combinedDegreesOfFreedom,
  type SourceFreedom,
} from '#shared/uncertainty/combined-degrees-of-freedom.ts';
import { meanOfRepeats } from '#shared/uncertainty/mean-of-repeats.ts';
import { standardUncertainty } from '#shared/uncertainty/standard-uncertainty.ts';
import type { Column, MadeOf, Part, Scalar } from './findings.ts';

/** Which rows of a column a mean is over, and what it is called. */
export interface MeanRequest {
  readonly column: Column;
  /** At least one row, all with a value. */
  readonly rows: readonly number[];
  /** Trials at the same setting that are left out. */
  readonly leftOut: readonly string[];
  /** Name of the source that stands for the scatter of this mean. */
  readonly source: string;
  /** Scatter found elsewhere (pooled over settings), used in place of this group's own. */
  readonly pooled?: { readonly scatter: number; readonly degreesOfFreedom: number } | undefined;
}

/** The part of a mean's uncertainty that repeats average away, before the shared parts. */
export interface RandomPart {
  readonly mean: number;
  readonly u: number;
  readonly scatter: number | null;
  readonly kind: 'group' | 'pooled' | 'instrument';
  readonly degreesOfFreedom: number;
}

/**
 * Random part of a mean: the scatter over √n, or the instrument's own part over √n where that is larger; what
 * the scatter cannot contain is added.
 *
 * Source: JCGM 100:2008, 4.2.3 (scatter), F.2.2.1 (the larger of scatter and resolution).
 */
export function randomPart({ column, rows, pooled }: MeanRequest): RandomPart {
  const repeats = meanOfRepeats(rows.map((row) => at(column.values, row)));
  const n = rows.length;
  let [inside, apart] = [0, 0];
  for (const row of rows) {
    const outside = column.apart === undefined ? 0 : at(column.apart, row);
    apart += outside ** 2;
    inside += Math.max(0, at(column.own, row) ** 2 - outside ** 2);
  }
  const instrument = Math.sqrt(inside) / n;
  const scatter = pooled?.scatter ?? repeats.scatter;
  const typeA = scatter === null ? 0 : scatter / Math.sqrt(n);
  const byScatter = scatter !== null && typeA >= instrument;
  const larger = byScatter ? typeA : instrument;
  const u = Math.hypot(larger, Math.sqrt(apart) / n);
  const freedom = pooled?.degreesOfFreedom ?? repeats.degreesOfFreedom;
  return {
    mean: repeats.mean,
    u,
    scatter,
    kind: !byScatter ? 'instrument' : pooled === undefined ? 'group' : 'pooled',
    degreesOfFreedom: byScatter && u > 0 ? freedom * (u / larger) ** 4 : Infinity,
  };
}

/** Mean of a column over some rows: its random part, then the shared parts in quadrature and not divided. */
export function meanOfRows(request: MeanRequest, freedomOf: (source: string) => SourceFreedom): Scalar {
  const { column, rows, source } = request;
  const random = randomPart(request);
  const parts: Part[] = random.u > 0 ? [{ source, c: random.u }] : [];
  for (const shared of column.shared) {
    let sum = 0;
    for (const row of rows) sum += at(shared.c, row);
    if (sum !== 0) parts.push({ source: shared.source, c: sum / rows.length });
  }
  const madeOf: MadeOf = {
    kind: 'mean',
    trials: rows.map((row) => item(column.trials, row)),
    leftOut: request.leftOut,
    scatter: random.scatter,
    scatterKind: random.kind,
  };
  return {
    shape: 'scalar',
    value: random.mean,
    u: parts.length === 0 ? null : standardUncertainty(parts),
    parts,
    degreesOfFreedom: combinedDegreesOfFreedom(parts, (part) =>
      part === source ? { degreesOfFreedom: random.degreesOfFreedom } : freedomOf(part),
    ),
    unit: column.unit,
    hue: column.hue,
    madeOf,
    warnings: scatterWarnings(random, rows.length),
  };
}

function scatterWarnings(random: RandomPart, n: number): string[] {
  if (n === 1) return ['One trial only: its scatter is not known.'];
  if (n === 2 && random.kind === 'group') return ['Two trials only: their scatter is poorly known.'];
  return [];
}
