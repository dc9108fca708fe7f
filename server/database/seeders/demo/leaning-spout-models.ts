/** The three models of the leaning spout, in the order in which the team came to them. */
import type { Model } from '#shared/evidence/evidence.ts';
import { momentBefore } from './demo-clock.ts';

const cm = (text: string) => ({ text, unit: 'cm' });
const degrees = (text: string) => ({ text, unit: '°' });

export function leaningSpoutModels(firstStart: Date): Model[] {
  return [
    {
      id: 'model-1',
      n: 1,
      name: 'free fall from the upright can',
      equations: [{ defines: 'q-r', expr: '2*sqrt({q-h}*{q-y})' }],
      output: 'q-r',
      limits: [
        { quantity: 'q-h', min: cm('2'), max: cm('20') },
        { quantity: 'q-theta', min: degrees('-0.5'), max: degrees('0.5') },
      ],
      assumptions: [
        { text: 'All of the head becomes speed.', neglects: 'losses in the spout' },
        { text: 'The jet flies freely.', neglects: 'drag' },
      ],
      at: momentBefore(firstStart, 22, '16:05'),
      by: 'Ines Farrow',
    },
    {
      id: 'model-2',
      n: 2,
      name: 'upright can with losses',
      equations: [
        { defines: 'q-head', expr: '{q-cv}^2*{q-h}' },
        { defines: 'q-r', expr: '2*sqrt({q-head}*{q-y})' },
      ],
      output: 'q-r',
      limits: [
        { quantity: 'q-h', min: cm('4'), max: cm('20'), reason: 'Below 4 cm the jet clings.' },
        { quantity: 'q-theta', min: degrees('-0.5'), max: degrees('0.5') },
      ],
      assumptions: [
        { text: 'The spout takes the same share of the speed at every head.' },
        { text: 'The jet flies freely.', neglects: 'drag' },
      ],
      at: momentBefore(firstStart, 20, '18:40'),
      by: 'Ines Farrow',
    },
    leanedModel(firstStart),
  ];
}

function leanedModel(firstStart: Date): Model {
  return {
    id: 'model-3',
    n: 3,
    name: 'leaned can',
    equations: [
      { defines: 'q-head', expr: '{q-cv}^2*{q-h}' },
      {
        defines: 'q-r',
        expr: '{q-head}*sin(2*{q-theta}) + 2*cos({q-theta})*sqrt({q-head}*({q-head}*sin({q-theta})^2 + {q-y}))',
      },
      { defines: 'q-best', expr: 'atan(sqrt({q-head}/({q-head} + {q-y})))' },
      { defines: 'q-rmax', expr: '2*sqrt({q-head}*({q-head} + {q-y}))' },
    ],
    output: 'q-r',
    limits: [
      { quantity: 'q-h', min: cm('4'), max: cm('20'), reason: 'Below 4 cm the jet clings.' },
      { quantity: 'q-theta', min: degrees('0'), max: degrees('60') },
    ],
    assumptions: [
      { text: 'The water in the can is at rest.', neglects: 'swirl' },
      {
        text: 'The jet leaves at right angles to the wall and keeps its speed coefficient when the can leans.',
      },
      { text: 'The jet flies freely, whole or broken.', neglects: 'drag' },
      {
        text: 'The head is that above the spout, without the pressure of the jet’s own skin.',
        neglects: 'surface tension',
      },
    ],
    at: momentBefore(firstStart, 9, '17:20'),
    by: 'Ines Farrow',
  };
}
