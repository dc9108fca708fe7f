import type { Chart, Claim, Comparison, Evidence, Series } from '#shared/evidence/evidence.ts';
import { momentBefore } from './demo-clock.ts';
import { leaningSpoutModels } from './leaning-spout-models.ts';
import { SPOUT_INSTRUMENTS, SPOUT_QUANTITIES } from './leaning-spout-register.ts';
import { leaningSpoutTrials } from './leaning-spout-trials.ts';

const SERIES: Series[] = [
  {
    id: 'series-a',
    letter: 'A',
    name: 'upright can, draining',
    held: { 'q-theta': { text: '0.0', unit: '°', u: '0.15' } },
    settings: ['q-h'],
    readings: ['q-r'],
  },
  {
    id: 'series-b',
    letter: 'B',
    name: 'lean varied at one head',
    held: { 'q-h': { text: '20.0', unit: 'cm' } },
    settings: ['q-theta'],
    readings: ['q-r'],
  },
];

const COMPARISONS: Comparison[] = [
  {
    id: 'c-upright',
    name: 'Upright can',
    model: 'model-3',
    selection: { series: ['series-a'], plusTrials: [], where: [] },
    free: [{ quantity: 'q-cv', start: { text: '1', unit: '1' }, min: null, max: null }],
    weights: 'absolute',
  },
  {
    id: 'c-lean',
    name: 'Lean varied',
    model: 'model-3',
    selection: { series: ['series-b'], plusTrials: ['trial-a1', 'trial-a2'], where: [] },
    free: [],
    weights: 'absolute',
  },
  {
    id: 'c-gentle',
    name: 'Leans up to 30°',
    model: 'model-3',
    selection: {
      series: ['series-b'],
      plusTrials: ['trial-a1', 'trial-a2'],
      where: [{ quantity: 'q-theta', min: null, max: { text: '30', unit: '°' } }],
    },
    free: [],
    weights: 'absolute',
  },
  {
    id: 'c-plain',
    name: 'Upright can without losses',
    model: 'model-1',
    selection: { series: ['series-a'], plusTrials: [], where: [] },
    free: [],
    weights: 'absolute',
  },
];

const CHARTS: Chart[] = [
  { id: 'chart-lean', n: 1, comparison: 'c-lean', x: 'q-theta', sentence: '' },
  { id: 'chart-upright', n: 2, comparison: 'c-upright', x: 'q-h', sentence: '' },
];

function claims(firstStart: Date): Claim[] {
  const declaredAt = momentBefore(firstStart, 22, '17:00');
  return [
    {
      id: 'claim-1',
      n: 1,
      text: 'Range grows as the square root of head, from 4 to 20 cm.',
      test: { kind: 'model fits', comparison: 'c-upright' },
      task: 'task-reach',
      declaredAt,
    },
    {
      id: 'claim-2',
      n: 2,
      text: 'With no refit it predicts the range up to a lean of 30°.',
      test: { kind: 'model fits', comparison: 'c-gentle' },
      task: 'task-limits',
      declaredAt,
    },
    {
      id: 'claim-3',
      n: 3,
      text: 'At a head of 20 cm the largest range is 47.9 cm.',
      test: {
        kind: 'equals',
        measured: {
          kind: 'mean',
          quantity: 'q-r',
          series: 'series-b',
          at: { 'q-theta': { text: '38', unit: '°' } },
        },
        expected: { kind: 'prediction', model: 'model-3', quantity: 'q-rmax', series: 'series-b', at: {} },
      },
      task: 'task-reach',
      declaredAt,
    },
    {
      id: 'claim-4',
      n: 4,
      text: 'The best lean nears 45° as the head grows.',
      test: null,
      openBecause: 'one head measured so far',
      task: 'task-furthest',
      declaredAt,
    },
  ];
}

/** The invented evidence of problem 1, Leaning Spout, as it stands at the first start. */
export function leaningSpoutEvidence(firstStart: Date): Evidence {
  return {
    version: 1,
    settings: { k: 2, rounding: 'one or two digits', level: 0.95, paper: 'A4' },
    instruments: SPOUT_INSTRUMENTS,
    quantities: SPOUT_QUANTITIES,
    series: SERIES,
    trials: leaningSpoutTrials(firstStart),
    models: leaningSpoutModels(firstStart),
    comparisons: COMPARISONS,
    claims: claims(firstStart),
    charts: CHARTS,
  };
}
