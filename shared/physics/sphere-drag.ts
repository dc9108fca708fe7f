import { rangesLeft, type Correlated } from './validity.ts';

/** A published fit of the drag coefficient of a smooth, single sphere that does not spin. */
export interface DragFit {
  readonly name: string;
  readonly source: string;
  /** Reynolds numbers in which its authors fitted it. */
  readonly min: number;
  readonly max: number;
  readonly coefficient: (reynolds: number) => number;
}

const stokes = (re: number) => 24 / re;

/**
 * Fits of the drag coefficient by name. Two published forms share the name Clift-Gauvin, so both stand here with their
 * coefficients. They differ from one another by about 5 % near Re = 100: that is an honest uncertainty of any of them.
 *
 * Source: beside each.
 *
 * @example Math.round(SPHERE_DRAG['Schiller-Naumann'].coefficient(100) * 1e4) // => 10917
 */
export const SPHERE_DRAG = {
  Stokes: {
    name: 'Stokes',
    source: 'G. G. Stokes, Trans. Camb. Phil. Soc. 9, 8 (1851)',
    min: 0,
    max: 0.1,
    coefficient: stokes,
  },
  'Schiller-Naumann': {
    name: 'Schiller-Naumann',
    source: 'L. Schiller, A. Naumann, Z. VDI 77, 318 (1935)',
    min: 0,
    max: 800,
    coefficient: (re) => stokes(re) * (1 + 0.15 * re ** 0.687),
  },
  'Clift-Gauvin A': {
    name: 'Clift-Gauvin A',
    source:
      'R. Clift, W. H. Gauvin, Can. J. Chem. Eng. 49, 439 (1971), coefficients 0.152, 0.677, 0.417, 5070, 0.94',
    min: 0,
    max: 2e5,
    coefficient: (re) => stokes(re) * (1 + 0.152 * re ** 0.677) + 0.417 / (1 + 5070 * re ** -0.94),
  },
  'Clift-Gauvin B': {
    name: 'Clift-Gauvin B',
    source: 'coefficients 0.15, 0.687, 0.42, 42500, 1.16 (from memory)',
    min: 0,
    max: 3e5,
    coefficient: (re) => stokes(re) * (1 + 0.15 * re ** 0.687) + 0.42 / (1 + 42500 * re ** -1.16),
  },
  'Brown-Lawler': {
    name: 'Brown-Lawler',
    source: 'P. P. Brown, D. F. Lawler, J. Environ. Eng. 129, 222 (2003), equation (19)',
    min: 0,
    max: 2e5,
    coefficient: (re) => stokes(re) * (1 + 0.15 * re ** 0.681) + 0.407 / (1 + 8710 / re),
  },
  Morrison: {
    name: 'Morrison',
    source: 'F. A. Morrison, An Introduction to Fluid Mechanics (2013), equation (8.83)',
    min: 0,
    max: 1e6,
    coefficient: (re) => {
      const small = re / 5;
      const large = re / 2.63e5;
      const million = re / 1e6;
      return (
        stokes(re) +
        (2.6 * small) / (1 + small ** 1.52) +
        (0.411 * large ** -7.94) / (1 + large ** -8) +
        (0.25 * million) / (1 + million)
      );
    },
  },
} as const satisfies Readonly<Record<string, DragFit>>;

export type DragFitName = keyof typeof SPHERE_DRAG;

/** What the fits leave open: roughness, walls, spin and turbulence are not in them. */
const SPREAD = 0.05;

/**
 * Drag coefficient of a smooth, single sphere.
 *
 * Source: the named fit's own; see SPHERE_DRAG. Accuracy: 5 %, the spread between the fits.
 *
 * @param reynolds - Re with the diameter, > 0
 * @param fit - which of the published fits
 * @returns the coefficient, with its uncertainty and the range left; NaN for Re ≤ 0
 * @example Math.round(sphereDrag(1, 'Schiller-Naumann').value * 10) // => 276
 */
export function sphereDrag(reynolds: number, fit: DragFitName): Correlated {
  const { coefficient, min, max }: DragFit = SPHERE_DRAG[fit];
  const value = reynolds > 0 ? coefficient(reynolds) : NaN;
  return { value, u: SPREAD * value, outside: rangesLeft([[{ of: 'Re', min, max }, reynolds]]) };
}
