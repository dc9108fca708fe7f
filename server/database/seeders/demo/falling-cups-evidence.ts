import type {
  Claim,
  Comparison,
  Evidence,
  Instrument,
  Model,
  Quantity,
  Series,
  Trial,
} from '#shared/evidence/evidence.ts';
import { momentBefore } from './demo-clock.ts';

const INSTRUMENTS: Instrument[] = [
  {
    id: 'i-frames',
    name: 'frame count',
    note: 'Leading edge, to the nearest half frame at either end.',
    parts: [
      {
        kind: 'scale',
        amount: '0.0125',
        unit: '1',
        shape: 'normal',
        shared: false,
        degreesOfFreedom: 30,
        reason:
          'drops of one stack scatter by 1.25 %, pooled over all stacks; half a frame at either end is in it',
      },
      {
        kind: 'scale',
        amount: '0.0029',
        unit: '1',
        shape: 'normal',
        shared: true,
        reason: 'parallax: cups within 2 cm of the plane of the bar, camera 4 m away',
      },
    ],
  },
];

function constant(
  id: string,
  symbol: string,
  name: string,
  reading: [string, string, string?],
  status: Quantity['status'],
  source: string,
): Quantity {
  const [text, unit, u] = reading;
  return {
    id,
    symbol,
    name,
    unit,
    status,
    source,
    def: { origin: 'constant', reading: { text, unit, ...(u === undefined ? {} : { u }) }, parts: [] },
  };
}

function derived(id: string, symbol: string, name: string, unit: string, expr: string): Quantity {
  return { id, symbol, name, unit, status: 'measured', def: { origin: 'derived', expr } };
}

function predicted(id: string, symbol: string, name: string, unit: string): Quantity {
  return { id, symbol, name, unit, status: 'predicted', def: { origin: 'predicted', model: 'model-2' } };
}

const QUANTITIES: Quantity[] = [
  {
    id: 'q-n',
    symbol: 'n',
    name: 'cups in the stack',
    unit: '1',
    status: 'measured',
    source: 'counted',
    def: { origin: 'recorded', instrument: null },
  },
  {
    id: 'q-frames',
    symbol: 'N',
    name: 'frames across the window',
    unit: 'frames',
    status: 'measured',
    source: 'film, every drop',
    def: { origin: 'recorded', instrument: 'i-frames' },
  },
  constant('q-window', 's', 'window', ['1.000', 'm', '0.001'], 'measured', 'scale bar in the picture'),
  constant('q-top', 'y_1', 'release to the window', ['2.20', 'm', '0.01'], 'measured', 'tape measure'),
  constant('q-rate', 'f', 'frame rate', ['119.88', 'frames/s', '0.06'], 'measured', 'counting light display'),
  constant(
    'q-m1',
    'm_1',
    'mass of one cup',
    ['0.842', 'g', '0.0004'],
    'measured',
    '20 cups on a 0.01 g balance',
  ),
  constant(
    'q-dia',
    'D',
    'diameter of the rim',
    ['98.0', 'mm', '0.5'],
    'measured',
    'six diameters; paper gives way',
  ),
  constant(
    'q-rho',
    'ρ',
    'density of the air',
    ['1.1825', 'kg/m^3', '0.0024'],
    'published',
    'from 22 °C, 1006 hPa and 45 % humidity',
  ),
  constant(
    'q-nu',
    'ν',
    'kinematic viscosity of the air',
    ['1.54e-5', 'm^2/s'],
    'published',
    'handbook, 22 °C',
  ),
  constant('q-g', 'g', 'free fall', ['9.8125', 'm/s^2', '0.0005'], 'published', 'from latitude and altitude'),
  derived('q-v', 'v', 'speed in the window', 'm/s', '{q-window}*{q-rate}/{q-frames}'),
  derived('q-m', 'm', 'mass of the stack', 'g', '{q-n}*{q-m1}'),
  derived('q-area', 'A', 'area of the rim', 'cm^2', 'pi/4*{q-dia}^2'),
  derived('q-ma', 'm_a', 'air carried along', 'g', '8/3*{q-rho}*({q-dia}/2)^3'),
  derived('q-re', 'R_e', 'Reynolds number', '1', '{q-v}*{q-dia}/{q-nu}'),
  {
    id: 'q-cd',
    symbol: 'C_d',
    name: 'resistance coefficient',
    unit: '1',
    status: 'fitted',
    source: 'fitted to series A',
    def: { origin: 'fitted', comparison: 'c-approach' },
  },
  predicted('q-vt', 'v_t', 'final speed', 'm/s'),
  predicted('q-lambda', 'λ', 'length of the approach', 'm'),
];

const SERIES: Series[] = [
  {
    id: 'series-a',
    letter: 'A',
    name: 'stacks of one to eight cups, 3.6 m drop',
    held: {},
    settings: ['q-n'],
    readings: ['q-frames'],
  },
];

/** Frames for 1.000 m, six drops of each stack. */
const FRAMES: readonly (readonly [cups: number, frames: readonly number[]])[] = [
  [1, [78, 79.5, 79.5, 78, 79, 79]],
  [2, [54, 56, 56, 56, 55.5, 55.5]],
  [3, [45.5, 47, 46, 45.5, 45.5, 46.5]],
  [4, [39, 40.5, 39.5, 38.5, 40, 39.5]],
  [6, [32.5, 33, 33, 32.5, 32.5, 33]],
  [8, [29, 29, 28.5, 29, 28.5, 28.5]],
];

/** One round of all stacks after another, so that a drift of the room cannot look like an effect of the mass. */
function trials(firstStart: Date): Trial[] {
  return [0, 1, 2, 3, 4, 5].flatMap((round) =>
    FRAMES.map(([cups, frames], stack) => {
      const number = round * FRAMES.length + stack + 1;
      const minutes = 15 * 60 + 4 * number;
      const time = `${String(Math.floor(minutes / 60)).padStart(2, '0')}:${String(minutes % 60).padStart(2, '0')}`;
      return {
        id: `trial-a${number}`,
        number,
        series: 'series-a',
        order: number,
        by: round % 2 === 0 ? 'Maren Tove' : 'Petra Abiola',
        at: momentBefore(firstStart, 25, time),
        values: {
          'q-n': { text: String(cups), unit: '1' },
          'q-frames': { text: String(frames[round] ?? 0), unit: 'frames' },
        },
      };
    }),
  );
}

const FINAL_SPEED = 'sqrt(2*{q-m}*{q-g}/({q-rho}*{q-cd}*{q-area}))';

function models(firstStart: Date): Model[] {
  const limits: Model['limits'] = [
    {
      quantity: 'q-re',
      min: { text: '5000', unit: '1' },
      max: { text: '50000', unit: '1' },
      reason: 'A blunt body: the coefficient is constant here.',
    },
  ];
  const steady = { text: 'The cups fall straight, mouth up, without rocking.' };
  return [
    {
      id: 'model-1',
      n: 1,
      name: 'final speed at once',
      equations: [
        { defines: 'q-vt', expr: FINAL_SPEED },
        { defines: 'q-v', expr: '{q-vt}' },
      ],
      output: 'q-v',
      limits,
      assumptions: [steady, { text: 'Final speed is reached before the window.', neglects: 'the approach' }],
      at: momentBefore(firstStart, 28, '16:30'),
      by: 'Maren Tove',
    },
    {
      id: 'model-2',
      n: 2,
      name: 'with the approach',
      equations: [
        { defines: 'q-vt', expr: FINAL_SPEED },
        { defines: 'q-lambda', expr: '({q-m} + {q-ma})/({q-rho}*{q-cd}*{q-area})' },
        {
          defines: 'q-v',
          expr: '{q-vt}*{q-window}/({q-window} + 2*{q-lambda}*(log(1 + sqrt(1 - exp(-({q-top} + {q-window})/{q-lambda}))) - log(1 + sqrt(1 - exp(-{q-top}/{q-lambda})))))',
        },
      ],
      output: 'q-v',
      limits,
      assumptions: [
        steady,
        { text: 'Resistance grows as the square of the speed from the start.' },
        {
          text: 'The air carried along is that of a disc of the rim’s diameter.',
          neglects: 'the depth of the stack',
        },
      ],
      at: momentBefore(firstStart, 24, '18:10'),
      by: 'Petra Abiola',
    },
  ];
}

function comparison(id: string, name: string, model: string, most: string | null): Comparison {
  const where = most === null ? [] : [{ quantity: 'q-n', min: null, max: { text: most, unit: '1' } }];
  return {
    id,
    name,
    model,
    selection: { series: ['series-a'], plusTrials: [], where },
    free: [
      { quantity: 'q-cd', start: { text: '1', unit: '1' }, min: { text: '0.05', unit: '1' }, max: null },
    ],
    weights: 'absolute',
  };
}

function claims(firstStart: Date): Claim[] {
  const declaredAt = momentBefore(firstStart, 26, '12:00');
  return [
    {
      id: 'claim-1',
      n: 1,
      text: 'Once the approach is counted, speed grows as the square root of mass.',
      test: { kind: 'model fits', comparison: 'c-approach' },
      task: 'task-speed',
      declaredAt,
    },
    {
      id: 'claim-2',
      n: 2,
      text: 'Up to four cups the final speed is reached before the window.',
      test: { kind: 'model fits', comparison: 'c-light' },
      task: 'task-speed',
      declaredAt,
    },
    {
      id: 'claim-3',
      n: 3,
      text: 'A cup resists less than a flat disc: C_d is below 1.1.',
      test: {
        kind: 'bound',
        value: { kind: 'quantity', quantity: 'q-cd' },
        side: 'at most',
        limit: { text: '1.1', unit: '1' },
      },
      task: 'task-resistance',
      declaredAt,
    },
    {
      id: 'claim-4',
      n: 4,
      text: 'The coefficient does not depend on speed, within 2 %.',
      test: null,
      openBecause: 'eight cups reach no further than a Reynolds number of 28 000',
      task: 'task-resistance',
      declaredAt,
    },
  ];
}

/** The invented evidence of problem 4, Falling Cups, as it stands at the first start. */
export function fallingCupsEvidence(firstStart: Date): Evidence {
  return {
    version: 1,
    settings: { k: 2, rounding: 'one or two digits', level: 0.95, paper: 'A4' },
    instruments: INSTRUMENTS,
    quantities: QUANTITIES,
    series: SERIES,
    trials: trials(firstStart),
    models: models(firstStart),
    comparisons: [
      comparison('c-approach', 'With the approach', 'model-2', null),
      comparison('c-steady', 'Final speed at once', 'model-1', null),
      comparison('c-light', 'Up to four cups', 'model-1', '4'),
    ],
    claims: claims(firstStart),
    charts: [{ id: 'chart-speed', n: 1, comparison: 'c-approach', x: 'q-n', sentence: '' }],
  };
}
