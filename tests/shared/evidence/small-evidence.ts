/** Tiny evidence for tests: a spring stretched by weights, with every part easy to change. */
import type {
  Comparison,
  Evidence,
  Instrument,
  Model,
  Quantity,
  QuantityDefinition,
  Reading,
  Series,
  Trial,
} from '#shared/evidence/evidence.ts';

export function reading(text: string, unit: string, u?: string): Reading {
  return u === undefined ? { text, unit } : { text, unit, u };
}

export function quantity(id: string, unit: string, def: QuantityDefinition, symbol = id): Quantity {
  return { id, symbol, name: `quantity ${symbol}`, unit, status: 'measured', def };
}

export function recorded(id: string, unit: string, instrument: string | null = null, symbol = id): Quantity {
  return quantity(id, unit, { origin: 'recorded', instrument }, symbol);
}

export function constant(id: string, value: Reading | null, unit = value?.unit ?? '1'): Quantity {
  return quantity(id, unit, { origin: 'constant', reading: value, parts: [] });
}

export function derived(id: string, unit: string, expr: string): Quantity {
  return quantity(id, unit, { origin: 'derived', expr });
}

export function trial(series: string, number: number, values: Record<string, Reading>): Trial {
  return {
    id: `${series}${number}`,
    number,
    series,
    order: number,
    by: 'Ines Farrow',
    at: '2026-03-01T10:00:00.000Z',
    values,
  };
}

export function instrument(id: string, parts: Instrument['parts']): Instrument {
  return { id, name: `the ${id}`, parts };
}

/** An instrument whose readings have u of their own, and one error in common. */
export function ruler(id: string, own: string, shared: string | null, unit: string): Instrument {
  const part = (amount: string, isShared: boolean): Instrument['parts'][number] => ({
    kind: isShared ? 'offset' : 'stated',
    amount,
    unit,
    shape: 'normal',
    shared: isShared,
  });
  return instrument(id, [part(own, false), ...(shared === null ? [] : [part(shared, true)])]);
}

export function series(
  id: string,
  settings: string[],
  readings: string[],
  held: Series['held'] = {},
): Series {
  return { id, letter: id, name: `series ${id}`, held, settings, readings };
}

export function model(id: string, n: number, output: string, equations: Model['equations']): Model {
  return { id, n, equations, output, limits: [], assumptions: [], at: '2026-02-01', by: 'Ines Farrow' };
}

export function comparison(
  id: string,
  modelId: string,
  ofSeries: string[],
  free: Record<string, Reading>,
): Comparison {
  return {
    id,
    name: `comparison ${id}`,
    model: modelId,
    selection: { series: ofSeries, plusTrials: [], where: [] },
    free: Object.entries(free).map(([id, start]) => ({ quantity: id, start, min: null, max: null })),
    weights: 'absolute',
  };
}

export function evidence(parts: Partial<Evidence>): Evidence {
  return {
    version: 1,
    settings: { k: 2, rounding: 'two digits', level: 0.95, paper: 'A4' },
    instruments: [],
    quantities: [],
    series: [],
    trials: [],
    models: [],
    comparisons: [],
    claims: [],
    charts: [],
    ...parts,
  };
}

/** Weights in g and lengths in mm that a spring of about 0.05 N/mm with 100 mm at rest would show. */
const STRETCHED: readonly (readonly [weight: string, lengths: readonly string[]])[] = [
  ['50', ['109.9', '109.7', '110.0']],
  ['100', ['119.4', '119.8', '119.5']],
  ['150', ['129.6', '129.2', '129.5']],
  ['200', ['139.3', '139.4', '139.0']],
  ['250', ['148.9', '149.2', '149.3']],
];

/**
 * L = L_0 + F/D: weight w (set) and length L (read) in series A, the force derived. The length's ruler has 0.2 mm of
 * its own and 0.5 mm in common; g has an uncertainty of its own.
 */
export function spring(): Evidence {
  const rows = STRETCHED.flatMap(([weight, lengths]) => lengths.map((length) => [weight, length] as const));
  return evidence({
    instruments: [ruler('ruler', '0.2', '0.5', 'mm')],
    quantities: [
      recorded('w', 'g'),
      recorded('L', 'mm', 'ruler'),
      constant('g', reading('9.81', 'm/s^2', '0.02')),
      derived('F', 'N', '{w}*{g}'),
      quantity('D', 'N/m', { origin: 'fitted', comparison: 'c1' }),
      quantity('L0', 'mm', { origin: 'fitted', comparison: 'c1' }, 'L_0'),
    ],
    series: [series('A', ['w'], ['L'])],
    trials: rows.map(([weight, length], i) =>
      trial('A', i + 1, { w: reading(weight, 'g'), L: reading(length, 'mm') }),
    ),
    models: [model('m1', 1, 'L', [{ defines: 'L', expr: '{L0} + {F}/{D}' }])],
    comparisons: [comparison('c1', 'm1', ['A'], { D: reading('40', 'N/m'), L0: reading('90', 'mm') })],
    charts: [{ id: 'ch1', n: 1, comparison: 'c1', x: 'w', sentence: '' }],
    claims: [
      {
        id: 'cl1',
        n: 1,
        text: 'The spring follows the weight.',
        test: { kind: 'model fits', comparison: 'c1' },
        declaredAt: '2026-02-01',
      },
    ],
  });
}
