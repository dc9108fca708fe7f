import type { Evidence, ProblemSettings, Quantity } from '#shared/evidence/evidence.ts';
import type { ChartFinding, ComparisonPoint, Scalar } from '#shared/evidence/findings.ts';
import { formatScalar } from '#shared/formatting/format-scalar.ts';
import { unitToText } from '#shared/formatting/unit-text.ts';
import { fromSi } from '#shared/units/convert.ts';
import { parseUnit } from '#shared/units/parse-unit.ts';
import { quantityLabel, symbolRuns } from './quantity-label.ts';
import { richTextWords } from './rich-text.ts';
import { tickText } from './linear-ticks.ts';

/** A chart as a table: the same points as words. */
export interface ChartTable {
  readonly head: readonly string[];
  readonly rows: readonly (readonly string[])[];
}

/**
 * The points of a chart as rows: setting, measured, predicted, difference, z and trials; then the trials left out.
 * Values carry their units, so that each row can be read alone.
 *
 * @param finding - the chart's finding, without a fault
 * @returns head and rows of equal length
 * @throws RangeError when an axis' quantity is not in the register
 */
export function chartTable(finding: ChartFinding, evidence: Evidence, settings: ProblemSettings): ChartTable {
  const x = quantityOf(finding.x, evidence);
  const y = quantityOf(finding.y, evidence);
  const value = (scalar: Scalar | null) =>
    scalar === null ? '' : formatScalar(scalar, y.unit, settings.rounding);
  const symbol = richTextWords(symbolRuns(y.symbol));
  const rows = finding.points.map((point) => [
    settingText(point, finding, x),
    value(point.measured),
    value(point.predicted),
    value(point.difference),
    point.z === null ? '' : tickText(Number(point.z.toFixed(1)), 0.1, true),
    point.trials.map((id) => trialName(id, evidence)).join(', '),
  ]);
  const left = finding.excluded.map((mark) => [
    plainValue(mark.x, x),
    plainValue(mark.y, y),
    '',
    '',
    '',
    `${trialName(mark.trial, evidence)}, excluded`,
  ]);
  return {
    head: [
      richTextWords(quantityLabel(x)),
      `${symbol} measured`,
      `${symbol} predicted`,
      'difference',
      'z',
      'trials',
    ],
    rows: [...rows, ...left],
  };
}

function quantityOf(id: string, evidence: Evidence): Quantity {
  const quantity = evidence.quantities.find((row) => row.id === id);
  if (!quantity) throw new RangeError(`chartTable: needs a quantity of the register, got ${id}`);
  return quantity;
}

function settingText(point: ComparisonPoint, finding: ChartFinding, x: Quantity): string {
  const reading = point.settings[finding.x];
  if (reading && reading.unit === x.unit) return reading.text;
  const at = point.at[finding.x];
  return at === undefined ? '' : shortNumber(at, x);
}

/** A reading without its uncertainty, to the digits that a reader can check against the trial. */
function plainValue(si: number, quantity: Quantity): string {
  const unit = quantity.unit === '1' ? '' : unitToText(quantity.unit);
  const gap = unit === '' || unit === '°' ? '' : '\u202f';
  return `${shortNumber(si, quantity)}${gap}${unit}`;
}

function shortNumber(si: number, quantity: Quantity): string {
  const parsed = parseUnit(quantity.unit);
  const value = parsed.ok ? fromSi(si, parsed.unit) : si;
  return String(Number(value.toPrecision(6))).replace('-', '−');
}

function trialName(id: string, evidence: Evidence): string {
  const trial = evidence.trials.find((row) => row.id === id);
  const letter = evidence.series.find((row) => row.id === trial?.series)?.letter ?? '';
  return trial ? `${letter}${trial.number}` : '';
}
