import type { Verdict } from '#shared/evidence/findings.ts';
import { pathOperators } from '../formulas/svg-path.ts';
import { factor, fillColour, length, strokeColour } from '../pdf/operators.ts';
import { INK_2, LEAK, WATER, WATER_FILL } from './print-style.ts';

/** Side of the square in which the vessels are drawn. */
const SIDE = 16;
const STROKE = 1.5;
/** A drop of radius 1 at (14.5, 14.3). */
const DROP =
  'M15.5 14.3C15.5 14.85 15.05 15.3 14.5 15.3C13.95 15.3 13.5 14.85 13.5 14.3C13.5 13.75 13.95 13.3 14.5 13.3C15.05 13.3 15.5 13.75 15.5 14.3Z';
const WATER_BODY = 'M3.2 6.2V11C3.2 12.436 4.364 13.6 5.8 13.6H10.2C11.636 13.6 12.8 12.436 12.8 11V6.2Z';
const VESSEL = 'M3.2 2.2V11C3.2 12.436 4.364 13.6 5.8 13.6H10.2C11.636 13.6 12.8 12.436 12.8 11V2.2';

interface VerdictDrawing {
  readonly colour: string;
  readonly ground: string | null;
  readonly fills: readonly string[];
  readonly strokes: readonly string[];
  /** Short strokes with square ends, so that they stay apart. */
  readonly dashes?: readonly string[];
}

/** The vessel of each verdict: full, with a hole and a drop, with a dashed line. */
const DRAWINGS: Readonly<Record<Verdict, VerdictDrawing>> = {
  Holds: { colour: WATER, ground: WATER_BODY, fills: [], strokes: [VESSEL, 'M3.2 6H12.8'] },
  Leaks: {
    colour: LEAK,
    ground: null,
    fills: [DROP],
    strokes: [
      'M2.2 2.2V11C2.2 12.436 3.364 13.6 4.8 13.6H8.2C9.636 13.6 10.8 12.436 10.8 11V10.4',
      'M10.8 2.2V6.8',
      'M2.2 8.4H10.4',
      'M11.2 8.6C13.1 8.7 14.2 9.9 14.4 12',
    ],
  },
  Undecided: {
    colour: INK_2,
    ground: null,
    fills: [],
    strokes: [VESSEL],
    dashes: ['M4.6 7.6H6.2', 'M7.2 7.6H8.8', 'M9.8 7.6H11.4'],
  },
};

export function verdictColour(verdict: Verdict): string {
  return DRAWINGS[verdict].colour;
}

/** Operators that draw a verdict's vessel in a square with its upper left corner at (x, y). */
export function verdictOperators(verdict: Verdict, x: number, y: number, side: number): string {
  const { colour, ground, fills, strokes, dashes = [] } = DRAWINGS[verdict];
  const scale = factor(side / SIDE);
  return [
    `q ${scale} 0 0 ${scale} ${length(x)} ${length(y)} cm`,
    `${STROKE} w 1 J ${strokeColour(colour)}`,
    ...(ground === null ? [] : [`${fillColour(WATER_FILL)} ${pathOperators(ground)} f`]),
    fillColour(colour),
    ...fills.map((path) => `${pathOperators(path)} f`),
    ...strokes.map((path) => `${pathOperators(path)} S`),
    '0 J',
    ...dashes.map((path) => `${pathOperators(path)} S`),
    'Q',
  ].join('\n');
}
