/** The invented trials of the leaning spout: an upright can draining, then one head at seven leans. */
import type { Trial } from '#shared/evidence/evidence.ts';
import { minutesBefore, momentBefore } from './demo-clock.ts';

type By = 'Kasimir Lund' | 'Maren Tove' | 'Ines Farrow';
const TURN: readonly By[] = ['Kasimir Lund', 'Maren Tove', 'Ines Farrow'];

/** Head in cm, range in cm, its uncertainty; A1 to A12. */
const UPRIGHT: readonly (readonly [head: string, range: string, u: string])[] = [
  ['20.0', '30.0', '0.4'],
  ['20.0', '29.7', '0.4'],
  ['16.0', '26.8', '0.4'],
  ['16.0', '27.0', '0.4'],
  ['12.0', '23.6', '0.4'],
  ['12.0', '23.2', '0.4'],
  ['8.0', '19.0', '0.4'],
  ['8.0', '18.4', '0.4'],
  ['4.0', '13.8', '0.4'],
  ['4.0', '13.2', '0.4'],
  ['2.0', '8.0', '0.6'],
  ['2.0', '7.9', '0.6'],
];

/** Lean in degrees, range in cm; B1 to B19. The last seven are of the first start's own day. */
const LEANED: readonly (readonly [lean: string, range: string])[] = [
  ['10', '36.4'],
  ['10', '36.4'],
  ['10', '36.1'],
  ['20', '42.3'],
  ['20', '42.8'],
  ['20', '42.4'],
  ['30', '46.0'],
  ['30', '45.7'],
  ['30', '46.5'],
  ['38', '46.1'],
  ['38', '43.5'],
  ['38', '46.3'],
  ['38', '46.9'],
  ['45', '45.0'],
  ['45', '45.2'],
  ['45', '44.3'],
  ['55', '39.4'],
  ['55', '39.9'],
  ['55', '39.7'],
];

/** Minutes before the first start at which B13 to B19 were logged. */
const LATELY = [188, 54, 48, 41, 23, 17, 10];
const FIRST_OF_TODAY = 13;

function person(index: number): By {
  return TURN[index % TURN.length] ?? 'Ines Farrow';
}

/** "09:30" and so many minutes. */
function clock(minutes: number): string {
  const all = 9 * 60 + 30 + minutes;
  return `${String(Math.floor(all / 60)).padStart(2, '0')}:${String(all % 60).padStart(2, '0')}`;
}

function uprightTrials(firstStart: Date): Trial[] {
  return UPRIGHT.map(([head, range, u], index) => ({
    id: `trial-a${index + 1}`,
    number: index + 1,
    series: 'series-a',
    order: index + 1,
    by: person(index),
    at: momentBefore(firstStart, 21, clock(7 * index)),
    values: { 'q-h': { text: head, unit: 'cm' }, 'q-r': { text: range, unit: 'cm', u } },
    ...(head === '2.0' ? { note: 'Jet clings to the wall.' } : {}),
  }));
}

function leanedTrials(firstStart: Date): Trial[] {
  return LEANED.map(([lean, range], index) => {
    const number = index + 1;
    const lately = LATELY[number - FIRST_OF_TODAY];
    const trial: Trial = {
      id: `trial-b${number}`,
      number,
      series: 'series-b',
      order: UPRIGHT.length + number,
      by: person(index),
      at:
        lately === undefined
          ? momentBefore(firstStart, 5, clock(6 * index))
          : minutesBefore(firstStart, lately),
      values: { 'q-theta': { text: lean, unit: '°' }, 'q-r': { text: range, unit: 'cm', u: '0.4' } },
    };
    return number === 11 ? { ...trial, excluded: slidBack(firstStart) } : trial;
  });
}

function slidBack(firstStart: Date): NonNullable<Trial['excluded']> {
  return {
    reason: 'Can slid back 3 cm; range read from the old mark',
    by: 'Ines Farrow',
    at: momentBefore(firstStart, 5, '11:12'),
  };
}

/** All 31 trials, dated back from the first start. */
export function leaningSpoutTrials(firstStart: Date): Trial[] {
  return [...uprightTrials(firstStart), ...leanedTrials(firstStart)];
}
