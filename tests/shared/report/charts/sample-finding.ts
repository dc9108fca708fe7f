/** One comparison as the leaning spout has it: seven leans, one excluded trial, trust up to 60 degrees. */
import type { Evidence, Quantity } from '#shared/evidence/evidence.ts';
import type { ChartFinding, ComparisonPoint, Scalar } from '#shared/evidence/findings.ts';

const DEGREE = Math.PI / 180;
const EFFECTIVE_HEAD = 0.187;
const SPOUT_HEIGHT = 0.12;

export const LEANS = [0, 10, 20, 30, 38, 45, 55];
const MEASURED_CM = [29.85, 36.3, 42.5, 46.07, 46.43, 44.83, 39.67];
const Z = [-0.21, -0.51, -0.22, -1.1, -2.2, -3.1, -3.6];

/** Range of the jet over a lean, both SI. */
export function rangeAt(lean: number): number {
  const up = EFFECTIVE_HEAD * Math.sin(lean) ** 2 + SPOUT_HEIGHT;
  return EFFECTIVE_HEAD * Math.sin(2 * lean) + 2 * Math.cos(lean) * Math.sqrt(EFFECTIVE_HEAD * up);
}

export function scalar(value: number, u: number | null): Scalar {
  return {
    shape: 'scalar',
    value,
    u,
    parts: [],
    degreesOfFreedom: Infinity,
    unit: 'cm',
    hue: 'measured',
    madeOf: { kind: 'entered' },
    warnings: [],
  };
}

export function samplePoint(lean: number, cm: number, z: number | null, series = 'B'): ComparisonPoint {
  const predicted = rangeAt(lean * DEGREE);
  return {
    trials: [`${series}${lean}a`, `${series}${lean}b`],
    settings: { lean: { text: String(lean), unit: '°' } },
    at: { lean: lean * DEGREE },
    measured: scalar(cm / 100, 0.0035),
    predicted: scalar(predicted, 0.005),
    difference: scalar(cm / 100 - predicted, 0.006),
    z,
    trusted: true,
    fittedTo: false,
  };
}

export function sampleFinding(changes: Partial<ChartFinding> = {}): ChartFinding {
  const x = Float64Array.from({ length: 133 }, (_, i) => i * 0.5 * DEGREE);
  return {
    id: 'chart-1',
    x: 'lean',
    y: 'range',
    curve: {
      x,
      y: x.map(rangeAt),
      u: x.map(() => 0.005),
      trusted: Uint8Array.from(x, (lean) => (lean <= 60 * DEGREE ? 1 : 0)),
    },
    points: LEANS.map((lean, i) => samplePoint(lean, MEASURED_CM[i] ?? 0, Z[i] ?? null)),
    excluded: [{ trial: 'B11', x: 38 * DEGREE, y: 0.435 }],
    sentence: 'Four of seven leans agree within 2u.',
    ...changes,
  };
}

const quantity = (id: string, symbol: string, name: string, unit: string, instrument: string): Quantity => ({
  id,
  symbol,
  name,
  unit,
  status: 'measured',
  def: { origin: 'recorded', instrument },
});

const trial = (id: string, number: number, series: string) => ({
  id,
  number,
  series,
  order: number,
  by: 'Ines Farrow',
  at: '2026-03-03T11:20:00Z',
  values: {},
});

export const SAMPLE_EVIDENCE: Evidence = {
  version: 1,
  settings: { k: 2, rounding: 'one or two digits', level: 0.95, paper: 'A4' },
  instruments: [
    {
      id: 'protractor',
      name: 'protractor',
      parts: [{ kind: 'stated', amount: '0.5', unit: '°', shape: 'normal', shared: false }],
    },
    { id: 'rule', name: 'steel rule', parts: [] },
  ],
  quantities: [
    quantity('lean', 'theta', 'lean of the can', '°', 'protractor'),
    quantity('range', 'R', 'range on the tray', 'cm', 'rule'),
  ],
  series: [
    { id: 's-b', letter: 'B', name: 'lean varied', held: {}, settings: ['lean'], readings: ['range'] },
    { id: 's-c', letter: 'C', name: 'lean varied again', held: {}, settings: ['lean'], readings: ['range'] },
  ],
  trials: [
    ...LEANS.flatMap((lean, i) => [
      trial(`B${lean}a`, 20 + 2 * i, 's-b'),
      trial(`B${lean}b`, 21 + 2 * i, 's-b'),
      trial(`C${lean}a`, 1 + i, 's-c'),
    ]),
    trial('B11', 11, 's-b'),
  ],
  models: [],
  comparisons: [],
  claims: [],
  charts: [{ id: 'chart-1', n: 1, comparison: 'c-1', x: 'lean', sentence: '' }],
};
