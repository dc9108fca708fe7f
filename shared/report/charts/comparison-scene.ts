/** A comparison's chart in the units of its axes: everything that is drawn, before it has a place on the page. */
import type { Evidence, ProblemSettings, Quantity } from '#shared/evidence/evidence.ts';
import type { ChartFinding, ComparisonPoint } from '#shared/evidence/findings.ts';
import { fromSi, uncertaintyFromSi } from '#shared/units/convert.ts';
import { parseUnit } from '#shared/units/parse-unit.ts';
import { settingUncertainty } from './setting-uncertainty.ts';

/** One measured point; bars are half-lengths, k times the standard uncertainty, null where none is known. */
export interface MeasuredPoint {
  readonly x: number;
  readonly y: number;
  readonly xBar: number | null;
  readonly yBar: number | null;
  readonly z: number | null;
  /** Index of the point in the finding. */
  readonly point: number;
}

export interface MeasuredSeries {
  readonly letter: string;
  readonly points: readonly MeasuredPoint[];
}

export interface ExcludedPoint {
  readonly x: number;
  readonly y: number;
  readonly trial: string;
  /** "B11". */
  readonly name: string;
}

/** A stretch of the predicted curve that lies wholly inside trust, or wholly outside it. */
export interface CurveStretch {
  readonly trusted: boolean;
  readonly x: readonly number[];
  readonly y: readonly number[];
  /** Half-width of the band, k times u. */
  readonly half: readonly number[];
}

export interface ComparisonScene {
  readonly x: Quantity;
  readonly y: Quantity;
  readonly k: number;
  readonly series: readonly MeasuredSeries[];
  readonly excluded: readonly ExcludedPoint[];
  readonly curve: readonly CurveStretch[];
  /** The interior maximum of the trusted curve, if it has one. */
  readonly largest: { readonly x: number; readonly y: number } | null;
  /** Some point stands for several trials. */
  readonly means: boolean;
  /** The model was fitted to these very trials. */
  readonly fitted: boolean;
}

type Convert = (value: number) => number;

/**
 * @throws RangeError when an axis' quantity or its unit is not in the register: such a chart has a fault and is not drawn
 */
export function comparisonScene(
  finding: ChartFinding,
  evidence: Evidence,
  settings: ProblemSettings,
): ComparisonScene {
  const x = axisOf(finding.x, evidence);
  const y = axisOf(finding.y, evidence);
  const k = settings.k;
  const curve = curveStretches(finding, x, y, k);
  return {
    x: x.quantity,
    y: y.quantity,
    k,
    series: measuredSeries(finding, evidence, x, y, k),
    excluded: finding.excluded.map((mark) => ({
      x: x.value(mark.x),
      y: y.value(mark.y),
      trial: mark.trial,
      name: trialName(mark.trial, evidence),
    })),
    curve,
    largest: largestInside(curve),
    means: finding.points.some((point) => point.trials.length > 1),
    fitted: finding.points.length > 0 && finding.points.every((point) => point.fittedTo),
  };
}

interface AxisQuantity {
  readonly quantity: Quantity;
  readonly value: Convert;
  readonly width: Convert;
}

function axisOf(id: string, evidence: Evidence): AxisQuantity {
  const quantity = evidence.quantities.find((row) => row.id === id);
  if (!quantity) throw new RangeError(`comparisonScene: needs a quantity of the register, got ${id}`);
  const parsed = parseUnit(quantity.unit);
  if (!parsed.ok) throw new RangeError(`comparisonScene: needs a known unit, got ${quantity.unit}`);
  return {
    quantity,
    value: (value) => fromSi(value, parsed.unit),
    width: (u) => uncertaintyFromSi(u, parsed.unit),
  };
}

function measuredSeries(
  finding: ChartFinding,
  evidence: Evidence,
  x: AxisQuantity,
  y: AxisQuantity,
  k: number,
): MeasuredSeries[] {
  const byLetter = new Map<string, MeasuredPoint[]>();
  finding.points.forEach((point, index) => {
    const at = point.at[finding.x];
    if (at === undefined) return;
    const xU = settingUncertainty(point, finding.x, evidence);
    const drawn: MeasuredPoint = {
      x: x.value(at),
      y: y.value(point.measured.value),
      xBar: xU === null ? null : k * x.width(xU),
      yBar: point.measured.u === null ? null : k * y.width(point.measured.u),
      z: point.z,
      point: index,
    };
    const letter = seriesLetter(point, evidence);
    const known = byLetter.get(letter);
    if (known) known.push(drawn);
    else byLetter.set(letter, [drawn]);
  });
  // The series that the chart is mostly about comes first, and so has the plain points.
  return [...byLetter]
    .map(([letter, points]) => ({ letter, points }))
    .toSorted((a, b) => b.points.length - a.points.length);
}

function seriesLetter(point: ComparisonPoint, evidence: Evidence): string {
  const trial = evidence.trials.find((row) => row.id === point.trials[0]);
  return evidence.series.find((row) => row.id === trial?.series)?.letter ?? '';
}

function trialName(id: string, evidence: Evidence): string {
  const trial = evidence.trials.find((row) => row.id === id);
  const letter = evidence.series.find((row) => row.id === trial?.series)?.letter ?? '';
  return trial ? `${letter}${trial.number}` : '';
}

function curveStretches(finding: ChartFinding, x: AxisQuantity, y: AxisQuantity, k: number): CurveStretch[] {
  const curve = finding.curve;
  if (!curve) return [];
  const stretches: { trusted: boolean; x: number[]; y: number[]; half: number[] }[] = [];
  let last: (typeof stretches)[number] | undefined;
  for (let i = 0; i < curve.x.length; i++) {
    const point = [curve.x[i] ?? NaN, curve.y[i] ?? NaN, curve.u[i] ?? NaN] as const;
    if (!Number.isFinite(point[0]) || !Number.isFinite(point[1])) {
      last = undefined;
      continue;
    }
    const trusted = curve.trusted[i] === 1;
    const px = x.value(point[0]);
    const py = y.value(point[1]);
    const half = Number.isFinite(point[2]) ? k * y.width(point[2]) : 0;
    if (last && last.trusted !== trusted) {
      // The two stretches meet in one point, so that the curve has no gap where trust ends.
      if (trusted) {
        last.x.push(px);
        last.y.push(py);
        last.half.push(half);
        last = undefined;
      } else {
        const next = { trusted, x: last.x.slice(-1), y: last.y.slice(-1), half: last.half.slice(-1) };
        stretches.push(next);
        last = next;
      }
    }
    if (!last) {
      last = { trusted, x: [], y: [], half: [] };
      stretches.push(last);
    }
    last.x.push(px);
    last.y.push(py);
    last.half.push(half);
  }
  return stretches.filter((stretch) => stretch.x.length > 1);
}

/** Vertex of the parabola through the highest sample and its neighbours; null where the highest is at an end. */
function largestInside(curve: readonly CurveStretch[]): { x: number; y: number } | null {
  const trusted = curve.filter((stretch) => stretch.trusted);
  const only = trusted.length === 1 ? trusted[0] : undefined;
  if (!only) return null;
  const highest = Math.max(...only.y);
  const i = only.y.indexOf(highest);
  const [x0, x1, x2] = [only.x[i - 1], only.x[i], only.x[i + 1]];
  const [y0, y1, y2] = [only.y[i - 1], only.y[i], only.y[i + 1]];
  if (x0 === undefined || x1 === undefined || x2 === undefined) return null;
  if (y0 === undefined || y1 === undefined || y2 === undefined) return null;
  const slopeLeft = (y1 - y0) / (x1 - x0);
  const slopeRight = (y2 - y1) / (x2 - x1);
  const bend = (slopeRight - slopeLeft) / (x2 - x0);
  if (!(bend < 0)) return null;
  const x = (x0 + x1) / 2 - slopeLeft / (2 * bend);
  const y = y0 + slopeLeft * (x - x0) + bend * (x - x0) * (x - x1);
  return { x, y };
}
