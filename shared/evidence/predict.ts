import { at } from '#shared/numeric/element.ts';
import { checkedReading, singleValue } from './constant-value.ts';
import type { Evidence, Reading } from './evidence.ts';
import { fault, isFault } from './fault.ts';
import { findingsValues } from './findings-values.ts';
import type { Fault, Findings, Group, Scalar } from './findings.ts';
import { madeOfExpression } from './input-refs.ts';
import { settingsKey } from './keys.ts';
import { knownAtPlace, placeOfGroup, type Place } from './place.ts';
import { modelName, symbolName } from './register.ts';
import { createScope, notDefined, type Scope } from './scope.ts';
import { toScalar } from './to-finding.ts';
import { rowOf, type Uncertain } from './uncertain.ts';
import type { Values } from './values.ts';

/** Where a model is asked: a setting of a series that need not have been logged yet. */
export interface PredictionPoint {
  readonly model: string;
  /** Quantity to predict: one that the model defines. */
  readonly quantity: string;
  readonly series: string;
  /** What is set, by quantity; what the series holds need not be repeated. */
  readonly values: Readonly<Record<string, Reading>>;
}

/** What a model predicts at a setting, with the uncertainty of the setting itself and of everything it is made from. */
export function predictAt(evidence: Evidence, findings: Findings, point: PredictionPoint): Scalar | Fault {
  return predictIn(findingsValues(findings, evidence), point);
}

/** The same from values wherever they are looked up. */
export function predictIn(values: Values, point: PredictionPoint): Scalar | Fault {
  const { register } = values;
  const model = register.models.get(point.model);
  const quantity = register.quantities.get(point.quantity);
  if (model === undefined) return fault('source gone', 'The model is gone. Choose another.', point.model);
  if (quantity === undefined)
    return fault('source gone', 'The predicted quantity is gone. Choose another.', point.quantity);
  if (!register.series.has(point.series))
    return fault('source gone', 'The series is gone. Choose another.', point.series);
  const equation = model.equations.find(({ defines }) => defines === quantity.id);
  if (equation === undefined) return notDefined(register, quantity.id, model.id);
  const place = placeOf(values, point);
  if (isFault(place)) return place;
  const scope = createScope(register, 1, knownAtPlace(values, place));
  const value = scope.find(quantity.id, model.id);
  if (isFault(value)) return value;
  if (!Number.isFinite(at(value.values, 0)))
    return fault(
      'missing input',
      `${symbolName(register, quantity.id)} cannot be predicted here: an input has no value.`,
      quantity.id,
    );
  const broken = brokenLimits(values, scope, model.id);
  return toScalar(value, {
    unit: quantity.unit,
    madeOf: madeOfExpression(values, equation.expr, {
      model: model.id,
      series: point.series,
      at: point.values,
    }),
    warnings: broken.map(
      (symbol) => `${symbol} lies outside the range in which ${modelName(register, model.id)} is trusted.`,
    ),
    freedomOf: (source) => values.freedomOf(source),
  });
}

/** Symbols of the limits of a model that a place breaks; a limit on something that has no value there is not judged. */
export function brokenLimits(values: Values, scope: Scope, model: string): readonly string[] {
  const { register } = values;
  const broken: string[] = [];
  for (const limit of register.models.get(model)?.limits ?? []) {
    const quantity = register.quantities.get(limit.quantity);
    const value = scope.find(limit.quantity, model);
    if (quantity === undefined || isFault(value)) continue;
    const end = (reading: Reading | null, open: number): number => {
      if (reading === null) return open;
      const read = checkedReading(register, reading, quantity, { words: () => 'A limit', at: model });
      return 'shape' in read ? open : read.value;
    };
    const here = rowOf(value.values, 0);
    if (here < end(limit.min, -Infinity) || here > end(limit.max, Infinity))
      broken.push(symbolName(register, quantity.id));
  }
  return broken;
}

/** The same at a setting, for a model that need not predict anything there. */
export function brokenLimitsAt(values: Values, point: Omit<PredictionPoint, 'quantity'>): readonly string[] {
  const place = placeOf(values, point);
  if (isFault(place)) return [];
  return brokenLimits(values, createScope(values.register, 1, knownAtPlace(values, place)), point.model);
}

type AskedPoint = Pick<PredictionPoint, 'series' | 'values'>;

/** The group that was logged there, or a place made from what is asked for. */
function placeOf(values: Values, point: AskedPoint): Place | Fault {
  const key = point.series + settingsKey(point.values);
  const group = values.groups(point.series).find((one) => one.key === key);
  if (group !== undefined && group.kept.length > 0) return placeOfGroup(values, group);
  return askedPlace(values, point, group ?? null);
}

function askedPlace(
  values: Values,
  { series, values: asked }: AskedPoint,
  group: Group | null,
): Place | Fault {
  const { register } = values;
  const set = new Map<string, Uncertain>();
  for (const [id, reading] of Object.entries(asked)) {
    const quantity = register.quantities.get(id);
    if (quantity === undefined)
      return fault('source gone', 'A setting is a quantity that is gone. Choose another.', id);
    const { def } = quantity;
    const instrument =
      def.origin === 'recorded' || def.origin === 'constant' ? (def.instrument ?? null) : null;
    const value = singleValue(register, {
      reading,
      quantity,
      instrument,
      parts: [],
      source: `set:${id}@${series}`,
      at: id,
    });
    if (isFault(value)) return value;
    set.set(id, value);
  }
  return { series, set, group };
}
