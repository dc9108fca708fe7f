import type { Claim, Comparison, Evidence, Model, Series, Trial } from '#shared/evidence/evidence.ts';
import { momentBefore } from './demo-clock.ts';
import { CUPS_INSTRUMENTS, CUPS_QUANTITIES } from './falling-cups-register.ts';

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
    instruments: CUPS_INSTRUMENTS,
    quantities: CUPS_QUANTITIES,
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
