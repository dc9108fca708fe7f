import { at } from '#shared/numeric/element.ts';
import type { ComparisonData } from './comparison-data.ts';
import { dependsOn } from './dependencies.ts';
import { differenceOf, residualParts, zOf } from './difference.ts';
import type { ValueReference } from './evidence.ts';
import { isFault } from './fault.ts';
import type { ComparisonPoint, Group, Scalar } from './findings.ts';
import { compareSettings } from './groups.ts';
import { madeOfExpression } from './input-refs.ts';
import { keyOf } from './keys.ts';
import { meanOfRows, randomPart } from './mean-of-group.ts';
import { knownAtPlace, placeOfGroup, rowsWithValue } from './place.ts';
import { modelName } from './register.ts';
import { createScope } from './scope.ts';
import { inRange, type Pick } from './selected-trials.ts';
import { toScalar } from './to-finding.ts';
import { rowOf, type Uncertain } from './uncertain.ts';
import type { Values } from './values.ts';

/** What the points of a comparison are made from. */
export interface PointsRequest {
  readonly values: Values;
  readonly data: ComparisonData;
  /** Values in use of the free parameters, with all their parts. */
  readonly parameters: ReadonlyMap<string, Uncertain>;
  /** Fits that gave a parameter to the model, each with the trials it was found from. */
  readonly fits: ReadonlyMap<string, ReadonlySet<string>>;
}

/** One point for each setting of the kept and complete trials, in increasing order of the settings. */
export function comparisonPoints(request: PointsRequest): readonly ComparisonPoint[] {
  const { values, data } = request;
  const groups = splitByGroup(values, [...data.used, ...data.untrusted]);
  const used = new Set(data.used.map(({ id }) => id));
  const points = groups.map(({ group, whole }) => pointOf(request, group, whole, used));
  const settings = settingsInOrder(values, data);
  return points.filter((point) => point !== null).sort((a, b) => compareSettings(settings, a, b));
}

/** All settings of the compared series, in the order in which the series are named. */
function settingsInOrder(values: Values, { comparison }: ComparisonData): readonly string[] {
  const rows = comparison.selection.series.map((id) => values.register.series.get(id));
  return [...new Set(rows.flatMap((row) => [...(row?.settings ?? [])]))];
}

interface PickedGroup {
  readonly group: Group;
  /** All kept trials of the group were picked. */
  readonly whole: boolean;
}

function splitByGroup(values: Values, picks: readonly Pick[]): readonly PickedGroup[] {
  const picked = new Map<string, Set<string>>();
  for (const { id, series } of picks) {
    const own = picked.get(series);
    if (own === undefined) picked.set(series, new Set([id]));
    else own.add(id);
  }
  return [...picked].flatMap(([series, ids]) =>
    values
      .groups(series)
      .map((group) => ({ group, kept: group.kept.filter((id) => ids.has(id)) }))
      .filter(({ kept }) => kept.length > 0)
      .map(({ group, kept }) => ({
        group: kept.length === group.kept.length ? group : { ...group, kept },
        whole: kept.length === group.kept.length,
      })),
  );
}

function pointOf(
  request: PointsRequest,
  group: Group,
  whole: boolean,
  used: ReadonlySet<string>,
): ComparisonPoint | null {
  const { values, data } = request;
  const measured = measuredAt(request, group, whole);
  if (measured === null) return null;
  const { predicted, taken, trusted } = predictedAt(request, group);
  const fitted = fitsBehind(request, group.kept);
  const difference =
    predicted === null ? null : pointDifference(request, group, { measured, predicted, fitted });
  const held = values.register.series.get(group.series)?.held ?? {};
  return {
    trials: group.kept,
    settings: { ...held, ...group.settings },
    at: { ...taken, ...group.at },
    measured: measured.scalar,
    predicted,
    difference,
    z: difference === null ? null : zOf(difference),
    trusted: trusted && group.kept.every((id) => used.has(id)),
    fittedTo: fitted.length > 0 && data.used.length > 0,
  };
}

interface MeasuredPoint {
  readonly scalar: Scalar;
  /** Name of the part that repeats average away. */
  readonly source: string;
  readonly degreesOfFreedom: number;
}

function measuredAt({ values, data }: PointsRequest, group: Group, whole: boolean): MeasuredPoint | null {
  const column = values.finding(data.model.output, group.series);
  if (column.shape !== 'column') return null;
  const rows = rowsWithValue(column, group.kept);
  if (rows.length === 0) return null;
  const source = `mean:${data.model.output}@${group.key}${whole ? '' : `|${group.kept.join(',')}`}`;
  const request = { column, rows, leftOut: group.excluded, source };
  return {
    scalar: meanOfRows(request, (id) => values.freedomOf(id)),
    source,
    degreesOfFreedom: randomPart(request).degreesOfFreedom,
  };
}

interface PredictedPoint {
  readonly predicted: Scalar | null;
  readonly taken: Readonly<Record<string, number>>;
  readonly trusted: boolean;
}

function predictedAt({ values, data, parameters }: PointsRequest, group: Group): PredictedPoint {
  const { model, limits } = data;
  const free = new Set(parameters.keys());
  const known = knownAtPlace(values, placeOfGroup(values, group));
  const taken: Record<string, number> = {};
  const scope = createScope(values.register, 1, (id) => {
    const value = parameters.get(id) ?? (dependsOn(values.register, id, free) ? null : known(id));
    if (value !== null && !isFault(value)) taken[id] = rowOf(value.values, 0);
    return value;
  });
  const value = scope.find(model.output, model.id);
  const trusted = limits.every((limit) => {
    const limited = scope.find(limit.quantity, model.id);
    return !isFault(limited) && inRange(rowOf(limited.values, 0), limit);
  });
  if (isFault(value) || !Number.isFinite(at(value.values, 0))) return { predicted: null, taken, trusted };
  const text = model.equations.find(({ defines }) => defines === model.output)?.expr ?? '';
  const predicted = toScalar(value, {
    unit: values.register.quantities.get(model.output)?.unit ?? '1',
    madeOf: madeOfExpression(values, text, { model: model.id, series: group.series, at: group.settings }),
    warnings: trusted
      ? []
      : [`The setting lies outside the range in which ${modelName(values.register, model.id)} is trusted.`],
    freedomOf: (id) => values.freedomOf(id),
  });
  return { predicted, taken, trusted };
}

/** Fits that were made to all of these trials and stand behind the prediction. */
function fitsBehind({ fits }: PointsRequest, trials: readonly string[]): readonly string[] {
  return [...fits].filter(([, used]) => trials.every((id) => used.has(id))).map(([comparison]) => comparison);
}

interface Sides {
  readonly measured: MeasuredPoint;
  readonly predicted: Scalar;
  /** Fits made to all trials of the measured side. */
  readonly fitted: readonly string[];
}

/**
 * Measured − predicted with its uncertainty. Where the model was fitted to these very trials the two sides move
 * together, so that the difference has variance um² − up² of the fit's statistical part, not the sum.
 */
function pointDifference(
  { values, data }: PointsRequest,
  group: Group,
  { measured, predicted, fitted }: Sides,
): Scalar {
  const freedomOf = (id: string) =>
    id === measured.source ? { degreesOfFreedom: measured.degreesOfFreedom } : values.freedomOf(id);
  const parts =
    fitted.length === 0
      ? undefined
      : residualParts({ measured: measured.scalar, source: measured.source, predicted, fits: fitted });
  return differenceOf(measured.scalar, predicted, pointMadeOf(group, data), freedomOf, parts);
}

function pointMadeOf(group: Group, { model }: ComparisonData): Scalar['madeOf'] {
  const place = { quantity: model.output, series: group.series, at: { ...group.settings } };
  const a: ValueReference = { kind: 'mean', ...place };
  const b: ValueReference = { kind: 'prediction', model: model.id, ...place };
  return { kind: 'difference', a: keyOf(a), b: keyOf(b), refs: [a, b] };
}
