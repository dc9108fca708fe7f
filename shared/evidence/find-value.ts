import { at } from '#shared/numeric/element.ts';
import { differenceOf, residualParts } from './difference.ts';
import type { Evidence, ValueReference } from './evidence.ts';
import { fault, isFault } from './fault.ts';
import { findingsValues } from './findings-values.ts';
import type { Fault, Findings, MadeOf, Scalar } from './findings.ts';
import { groupAt, meanAt } from './group-mean.ts';
import { keyOf } from './keys.ts';
import { rowsOf } from './place.ts';
import { predictIn } from './predict.ts';
import { symbolName, trialName } from './register.ts';
import type { Values } from './values.ts';
import { sameDimension } from '#shared/units/dimension.ts';
import { parseUnit } from '#shared/units/parse-unit.ts';
import { scalarOf } from './to-finding.ts';

/**
 * The value that a reference points at, or the fault that stands in its place. Means, predictions at a setting,
 * single readings and differences are made on the spot from the findings, differences by their parts, so that
 * shared sources cancel.
 */
export function findValue(findings: Findings, evidence: Evidence, ref: ValueReference): Scalar | Fault {
  const values = findingsValues(findings, evidence);
  switch (ref.kind) {
    case 'fit':
      return fitFigure(findings, ref);
    case 'claim':
      return claimFigure(findings, ref);
    case 'count':
      return countOf(findings, evidence, ref);
    case 'difference':
      return difference(findings, evidence, values, ref);
    default:
      return measuredOrPredicted(values, ref);
  }
}

type ValueOf<Kind extends ValueReference['kind']> = Extract<ValueReference, { kind: Kind }>;

type PlacedReference = ValueOf<'quantity' | 'mean' | 'prediction' | 'reading'>;

const placed = new WeakMap<Values, WeakMap<PlacedReference, Scalar | Fault>>();

/** Values that are looked up or computed at a place; each reference once. */
function measuredOrPredicted(values: Values, ref: PlacedReference): Scalar | Fault {
  let known = placed.get(values);
  if (known === undefined) placed.set(values, (known = new WeakMap()));
  let value = known.get(ref);
  if (value === undefined) known.set(ref, (value = valueAtPlace(values, ref)));
  return value;
}

function valueAtPlace(values: Values, ref: PlacedReference): Scalar | Fault {
  switch (ref.kind) {
    case 'quantity':
      return registerScalar(values, ref);
    case 'mean': {
      const group = groupAt(values, ref.series, ref.at);
      return isFault(group) ? group : meanAt(values, ref.quantity, group);
    }
    case 'prediction':
      return predictIn(values, {
        model: ref.model,
        quantity: ref.quantity,
        series: ref.series,
        values: ref.at,
      });
    case 'reading':
      return readingOf(values, ref);
  }
}

function registerScalar(values: Values, { quantity, series }: ValueOf<'quantity'>): Scalar | Fault {
  const finding = values.finding(quantity, series ?? null);
  if (finding.shape !== 'column') return finding;
  return fault(
    'no single value',
    `${symbolName(values.register, quantity)} differs from trial to trial. Name a setting.`,
    quantity,
  );
}

function readingOf(values: Values, { trial, quantity }: ValueOf<'reading'>): Scalar | Fault {
  const { register } = values;
  const row = register.trials.get(trial);
  if (row === undefined || row.withdrawn !== undefined)
    return fault(
      'source gone',
      `${trialName(register, trial)} is no longer in the log. Choose another trial.`,
      trial,
    );
  const finding = values.finding(quantity, row.series);
  if (finding.shape !== 'column') return finding;
  const [index] = rowsOf(finding, [trial]);
  const value = index === undefined ? NaN : at(finding.values, index);
  if (index === undefined || !Number.isFinite(value))
    return fault(
      'missing input',
      `${trialName(register, trial)} has no ${symbolName(register, quantity)}.`,
      trial,
    );
  const own = at(finding.own, index);
  const parts = [
    ...(own > 0 ? [{ source: `trial:${trial}:${quantity}`, c: own }] : []),
    ...finding.shared.map(({ source, c }) => ({ source, c: at(c, index) })).filter(({ c }) => c !== 0),
  ];
  return scalarOf(
    { value, parts, known: parts.length > 0, hue: finding.hue },
    {
      unit: finding.unit,
      madeOf: { kind: 'entered' },
      warnings: [],
      freedomOf: (source) => values.freedomOf(source),
    },
  );
}

function figure(value: number, unit: string, madeOf: MadeOf, hue: Scalar['hue'] = 'count'): Scalar {
  return {
    shape: 'scalar',
    value,
    u: null,
    parts: [],
    degreesOfFreedom: Infinity,
    unit,
    hue,
    madeOf,
    warnings: [],
  };
}

function fitFigure(findings: Findings, { comparison, figure: name }: ValueOf<'fit'>): Scalar | Fault {
  const finding = findings.comparisons.get(comparison);
  if (finding === undefined)
    return fault('source gone', 'The comparison is gone. Choose another.', comparison);
  if (finding.fault !== undefined) return finding.fault;
  const { chiSquared, degreesOfFreedom, pValue, aicc, worstZ } = finding;
  const figures = {
    'chi-squared': chiSquared,
    'degrees of freedom': degreesOfFreedom,
    'p-value': pValue,
    'reduced chi-squared': chiSquared === null || !degreesOfFreedom ? null : chiSquared / degreesOfFreedom,
    AICc: aicc,
    'worst z': worstZ,
  };
  const value = figures[name];
  if (value === null)
    return fault(
      'missing input',
      `This comparison has no ${name}: it has too few trials, or their uncertainties are not known.`,
      comparison,
    );
  return figure(value, '1', { kind: 'fit', comparison }, name === 'worst z' ? 'difference' : 'count');
}

function claimFigure(findings: Findings, { claim, figure: name }: ValueOf<'claim'>): Scalar | Fault {
  const finding = findings.claims.get(claim);
  if (finding === undefined) return fault('source gone', 'The claim is gone. Choose another.', claim);
  if (name === 'k') return figure(finding.k, '1', { kind: 'entered' });
  if (finding.fault !== undefined) return finding.fault;
  if (name === 'difference' && finding.difference !== null) return finding.difference;
  if (name === 'z' && finding.z !== null)
    return figure(finding.z, '1', finding.difference?.madeOf ?? { kind: 'entered' }, 'difference');
  return fault(
    'missing input',
    `This claim has no ${name === 'z' ? 'z' : 'difference'}: ${finding.sentence}`,
    claim,
  );
}

function countOf(
  findings: Findings,
  evidence: Evidence,
  { of, series, comparison }: ValueOf<'count'>,
): Scalar | Fault {
  if (of === 'used') {
    const finding = comparison === undefined ? undefined : findings.comparisons.get(comparison);
    if (finding === undefined)
      return fault('source gone', 'The comparison is gone. Choose another.', comparison ?? '');
    return figure(finding.used.length, '1', { kind: 'count', trials: finding.used });
  }
  if (series !== undefined && !findings.groups.has(series))
    return fault('source gone', 'The series is gone. Choose another.', series);
  const trials = evidence.trials.filter(
    (trial) =>
      trial.withdrawn === undefined &&
      (series === undefined || trial.series === series) &&
      (of === 'trials' || (trial.excluded === undefined) === (of === 'kept')),
  );
  const counted = series === undefined ? findings.counts?.[of] : undefined;
  return figure(counted ?? trials.length, '1', { kind: 'count', trials: trials.map(({ id }) => id) });
}

function difference(
  findings: Findings,
  evidence: Evidence,
  values: Values,
  ref: ValueOf<'difference'>,
): Scalar | Fault {
  const a = findValue(findings, evidence, ref.a);
  if (isFault(a)) return a;
  const b = findValue(findings, evidence, ref.b);
  if (isFault(b)) return b;
  const [left, right] = [parseUnit(a.unit), parseUnit(b.unit)];
  if (left.ok && right.ok && !sameDimension(left.unit.dimension, right.unit.dimension))
    return fault(
      'dimension mismatch',
      `${a.unit} and ${b.unit} cannot be subtracted. Choose two values of the same kind.`,
      placeOfRef(ref.b),
    );
  const madeOf: MadeOf = { kind: 'difference', a: keyOf(ref.a), b: keyOf(ref.b), refs: [ref.a, ref.b] };
  const fits = fitsTo(findings, ref, a, b);
  const source = `mean:${keyOf(ref.a)}`;
  const parts = fits.length === 0 ? undefined : residualParts({ measured: a, source, predicted: b, fits });
  return differenceOf(a, b, madeOf, (part) => values.freedomOf(part), parts);
}

function placeOfRef(ref: ValueReference): string {
  return 'quantity' in ref ? ref.quantity : keyOf(ref);
}

/** Fits behind b that were made to all trials of a, where b is the prediction of the very mean a. */
function fitsTo(
  findings: Findings,
  { a: left, b: right }: ValueOf<'difference'>,
  a: Scalar,
  b: Scalar,
): readonly string[] {
  if (left.kind !== 'mean' || right.kind !== 'prediction' || a.madeOf.kind !== 'mean') return [];
  if (
    left.quantity !== right.quantity ||
    keyOf({ ...left, kind: 'mean' }) !== keyOf({ ...right, kind: 'mean' })
  )
    return [];
  const { trials } = a.madeOf;
  const behind = new Set(
    b.parts.filter(({ source }) => source.startsWith('fit:')).map(({ source }) => source.split(':')[1] ?? ''),
  );
  return [...behind].filter((id) => {
    const used = new Set(findings.comparisons.get(id)?.used ?? []);
    return trials.every((trial) => used.has(trial));
  });
}
