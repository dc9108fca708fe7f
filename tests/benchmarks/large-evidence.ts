/** A problem as large as one may be: 10 000 trials, 12 columns, 60 derived quantities, 15 comparisons, 20 claims. */
import type {
  Claim,
  Comparison,
  Evidence,
  Model,
  Quantity,
  Reading,
  Series,
  Trial,
} from '#shared/evidence/evidence.ts';

export const TRIALS = 10_000;
const SERIES_COUNT = 20;
const SETTINGS = 2;
const READINGS = 10;
const DERIVED = 60;
const COMPARISONS = 15;
const CLAIMS = 20;
const REPEATS = 5;

/** Numbers between 0 and 1 that are the same at every run. */
function seededNoise(seed: number): () => number {
  let state = seed;
  return () => {
    state = (Math.imul(state, 1_664_525) + 1_013_904_223) >>> 0;
    return state / 2 ** 32;
  };
}

const column = (i: number): string => (i < SETTINGS ? `s${i}` : `r${i - SETTINGS}`);

function columns(): Quantity[] {
  return Array.from({ length: SETTINGS + READINGS }, (_, i) => ({
    id: column(i),
    symbol: i < SETTINGS ? `x_${i + 1}` : `y_${i - SETTINGS + 1}`,
    name: `column ${i}`,
    unit: 'cm',
    status: 'measured' as const,
    def: { origin: 'recorded' as const, instrument: 'rule' },
  }));
}

/** Each from two columns and, in turn, the derived quantity before it. */
function derivedQuantities(): Quantity[] {
  return Array.from({ length: DERIVED }, (_, i) => {
    const [a, b] = [column(SETTINGS + (i % READINGS)), column(i % SETTINGS)];
    const before = i % 3 === 0 ? '' : ` + 0.1*{d${i - 1}}`;
    return {
      id: `d${i}`,
      symbol: `z_${i + 1}`,
      name: `derived ${i}`,
      unit: 'cm',
      status: 'measured' as const,
      def: { origin: 'derived' as const, expr: `sqrt({${a}}^2 + {${b}}^2)*cos({${b}}/(3*{${a}}))${before}` },
    };
  });
}

function seriesRows(): Series[] {
  const all = Array.from({ length: SETTINGS + READINGS }, (_, i) => column(i));
  return Array.from({ length: SERIES_COUNT }, (_, i) => ({
    id: `series-${i}`,
    letter: String.fromCharCode(65 + i),
    name: '',
    held: {},
    settings: all.slice(0, SETTINGS),
    readings: all.slice(SETTINGS),
  }));
}

function trialRows(): Trial[] {
  const noise = seededNoise(7);
  const each = TRIALS / SERIES_COUNT;
  return Array.from({ length: TRIALS }, (_, i) => {
    const number = (i % each) + 1;
    const level = Math.floor((number - 1) / REPEATS);
    const [x1, x2] = [10 + (level % 20), 5 + Math.floor(level / 20)];
    const values: Record<string, Reading> = {
      s0: { text: x1.toFixed(1), unit: 'cm' },
      s1: { text: x2.toFixed(1), unit: 'cm' },
    };
    for (let r = 0; r < READINGS; r++) {
      const value = 4 * Math.sqrt(x1 * x2) * (1 + r / 50) + 0.4 * (noise() + noise() + noise() - 1.5);
      values[`r${r}`] = { text: value.toFixed(2), unit: 'cm' };
    }
    return {
      id: `trial-${i}`,
      number,
      series: `series-${Math.floor(i / each)}`,
      order: i,
      by: 'Ines Farrow',
      at: '2026-03-01T10:00:00.000Z',
      values,
    };
  });
}

function models(): Model[] {
  return Array.from({ length: READINGS }, (_, r) => ({
    id: `model-${r}`,
    n: r + 1,
    equations: [{ defines: `r${r}`, expr: '{a}*sqrt({s0}*{s1})*exp(-{s0}/{b}) + {c}' }],
    output: `r${r}`,
    limits: [],
    assumptions: [],
    at: '2026-02-01',
    by: 'Ines Farrow',
  }));
}

function parameter(id: string, unit: string): Quantity {
  return {
    id,
    symbol: id,
    name: id,
    unit,
    status: 'fitted',
    def: { origin: 'fitted', comparison: 'comparison-0' },
  };
}

function comparisons(): Comparison[] {
  const free = (quantity: string, text: string, unit: string) => ({
    quantity,
    start: { text, unit },
    min: null,
    max: null,
  });
  return Array.from({ length: COMPARISONS }, (_, i) => ({
    id: `comparison-${i}`,
    name: `comparison ${i}`,
    model: `model-${i % READINGS}`,
    selection: { series: [`series-${i}`], plusTrials: [], where: [] },
    free: [free('a', '3', '1'), free('c', '0', 'cm')],
    weights: 'absolute' as const,
  }));
}

function claims(): Claim[] {
  return Array.from({ length: CLAIMS }, (_, i) => {
    const at = { s0: { text: '12.0', unit: 'cm' }, s1: { text: '6.0', unit: 'cm' } };
    const place = { quantity: `r${i % READINGS}`, series: `series-${i}`, at };
    return {
      id: `claim-${i}`,
      n: i + 1,
      text: `claim ${i}`,
      test:
        i % 2 === 0
          ? { kind: 'model fits' as const, comparison: `comparison-${i % COMPARISONS}` }
          : {
              kind: 'equals' as const,
              measured: { kind: 'mean' as const, ...place },
              expected: { kind: 'prediction' as const, model: `model-${i % READINGS}`, ...place },
            },
      declaredAt: '2026-02-01',
    };
  });
}

/** The whole problem, anew at every call, so that nothing kept for an earlier one can help. */
export function largeEvidence(): Evidence {
  return {
    version: 1,
    settings: { k: 2, rounding: 'two digits', level: 0.95, paper: 'A4' },
    instruments: [
      {
        id: 'rule',
        name: 'rule',
        parts: [
          { kind: 'stated', amount: '0.2', unit: 'cm', shape: 'normal', shared: false },
          { kind: 'offset', amount: '0.05', unit: 'cm', shape: 'normal', shared: true },
          { kind: 'scale', amount: '0.001', unit: '1', shape: 'normal', shared: true },
        ],
      },
    ],
    quantities: [
      ...columns(),
      ...derivedQuantities(),
      parameter('a', '1'),
      parameter('c', 'cm'),
      {
        id: 'b',
        symbol: 'b',
        name: 'range of the loss',
        unit: 'm',
        status: 'assumed',
        def: { origin: 'constant', reading: { text: '40', unit: 'm', u: '2' }, parts: [] },
      },
    ],
    series: seriesRows(),
    trials: trialRows(),
    models: models(),
    comparisons: comparisons(),
    claims: claims(),
    charts: [],
  };
}
