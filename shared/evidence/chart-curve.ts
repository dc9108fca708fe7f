import type { ComparisonData } from './comparison-data.ts';
import { dependsOn } from './dependencies.ts';
import { isFault } from './fault.ts';
import type { ChartFinding, ComparisonPoint, Fault, Group } from './findings.ts';
import { knownAtPlace, placeOfGroup } from './place.ts';
import { createScope, type Scope } from './scope.ts';
import { inRange } from './selected-trials.ts';
import { rootSumOfSquares, rowOf, type Uncertain } from './uncertain.ts';
import type { Values } from './values.ts';

/** Points of a curve: enough for a line that looks smooth at the width of a page. */
const CURVE_POINTS = 241;

/** Air beside the outermost points, as a share of their distance. */
const AIR = 0.04;

/** What a curve is drawn from. */
export interface CurveRequest {
  readonly values: Values;
  /** Quantity on the horizontal axis. */
  readonly x: string;
  readonly data: ComparisonData;
  readonly parameters: ReadonlyMap<string, Uncertain>;
  /** Where the other inputs are taken from. */
  readonly group: Group;
  /** At least one has a value on the axis. */
  readonly points: readonly ComparisonPoint[];
}

/** The predicted curve: the model along the axis, with the axis’ own uncertainty as it is at the reference group. */
export function chartCurve(request: CurveRequest): NonNullable<ChartFinding['curve']> | Fault {
  const { x, data, points } = request;
  const xs = points.map((point) => point.at[x] ?? NaN).filter(Number.isFinite);
  const axis = axisOf(Math.min(...xs), Math.max(...xs));
  const scope = scopeAlong(request, axis);
  const y = scope.find(data.model.output, data.model.id);
  if (isFault(y)) return y;
  const n = axis.length;
  return {
    x: axis,
    y: Float64Array.from(axis, (_, i) => rowOf(y.values, i)),
    u: rootSumOfSquares(y.terms, n) ?? new Float64Array(n),
    trusted: trustedAlong(data, scope, n),
  };
}

function scopeAlong({ values, x, parameters, group }: CurveRequest, axis: Float64Array): Scope {
  const known = knownAtPlace(values, placeOfGroup(values, group));
  const own = known(x);
  const terms = own === null || isFault(own) ? [] : own.terms;
  const along: Uncertain = { values: axis, terms, known: true, hue: 'measured' };
  const moving = new Set([x, ...parameters.keys()]);
  return createScope(values.register, axis.length, (id) => {
    if (id === x) return along;
    return parameters.get(id) ?? (dependsOn(values.register, id, moving) ? null : known(id));
  });
}

function trustedAlong({ limits, model }: ComparisonData, scope: Scope, n: number): Uint8Array {
  const trusted = new Uint8Array(n).fill(1);
  for (const limit of limits) {
    const value = scope.find(limit.quantity, model.id);
    for (let i = 0; i < n; i++) if (isFault(value) || !inRange(rowOf(value.values, i), limit)) trusted[i] = 0;
  }
  return trusted;
}

function axisOf(low: number, high: number): Float64Array {
  const air = high > low ? AIR * (high - low) : 0.1 * Math.abs(low) || 1;
  const [from, to] = [low - air, high + air];
  const start = low >= 0 && from < 0 ? 0 : from;
  return Float64Array.from(
    { length: CURVE_POINTS },
    (_, i) => start + ((to - start) * i) / (CURVE_POINTS - 1),
  );
}
