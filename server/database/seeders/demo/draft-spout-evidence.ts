import type { Evidence, Trial } from '#shared/evidence/evidence.ts';

/** A few trials of the leaning spout. */
export function draftSpoutEvidence(firstStart: Date): Evidence {
  const trial = (number: number, angle: string, reach: string): Trial => ({
    id: `trial-b${number}`,
    number,
    series: 'series-b',
    order: number,
    by: 'Kasimir Lund',
    at: new Date(firstStart.getTime() - 5 * 86_400_000 + number * 600_000).toISOString(),
    values: { 'q-theta': { text: angle, unit: '°' }, 'q-r': { text: reach, unit: 'cm' } },
  });
  return {
    version: 1,
    settings: { k: 2, rounding: 'one or two digits', level: 0.95, paper: 'A4' },
    instruments: [],
    quantities: [
      {
        id: 'q-theta',
        symbol: 'θ',
        name: 'lean of the can',
        unit: '°',
        status: 'measured',
        def: { origin: 'recorded', instrument: null },
      },
      {
        id: 'q-r',
        symbol: 'R',
        name: 'range on the tray',
        unit: 'cm',
        status: 'measured',
        def: { origin: 'recorded', instrument: null },
      },
    ],
    series: [
      {
        id: 'series-b',
        letter: 'B',
        name: 'lean, head 20.0 cm',
        held: {},
        settings: ['q-theta'],
        readings: ['q-r'],
      },
    ],
    trials: [trial(1, '10', '36.4'), trial(2, '20', '42.3'), trial(3, '30', '46.0')],
    models: [],
    comparisons: [],
    claims: [],
    charts: [],
  };
}
