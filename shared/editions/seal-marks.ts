/** The drawing of a seal: a ring of marks, one for each bit of the first figures of its fingerprint. */

/** A mark of the ring, in a square of side 100: a stroke for one, a dot for nought. */
export type SealMark =
  | {
      readonly kind: 'stroke';
      readonly x1: number;
      readonly y1: number;
      readonly x2: number;
      readonly y2: number;
    }
  | { readonly kind: 'dot'; readonly x: number; readonly y: number };

/** The drawing's own measures, in a square of side 100 with its centre at 50. */
export const SEAL_SHAPE = {
  side: 100,
  outerRadius: 48,
  innerRadius: 31.5,
  dotRadius: 0.95,
  markWidth: 2.1,
  outerWidth: 1.6,
  innerWidth: 1.1,
  /** The line under the number. */
  foot: { from: 37, to: 63, y: 60.5, width: 1.2 },
  /** The number's baseline and size. */
  number: { y: 57, size: 30 },
} as const;

const MARKS = 48;
const CENTRE = 50;
const STROKE_FROM = 36;
const STROKE_TO = 44;
const DOT_AT = 36.9;

/**
 * The 48 marks of a seal, from the top clockwise.
 *
 * @param seal - at least 12 hexadecimal figures
 * @throws RangeError when there are fewer
 * @example sealMarks('800000000000')[0]?.kind // => 'stroke'
 * @example sealMarks('800000000000')[1]?.kind // => 'dot'
 */
export function sealMarks(seal: string): SealMark[] {
  const figures = seal.slice(0, MARKS / 4);
  if (!/^[0-9a-f]{12}$/.test(figures)) {
    throw new RangeError(`sealMarks: needs 12 hexadecimal figures, got ${figures}`);
  }
  const bits = [...figures].flatMap((figure) => [
    ...Number.parseInt(figure, 16).toString(2).padStart(4, '0'),
  ]);
  return bits.map((bit, index) => {
    const angle = (index / MARKS) * 2 * Math.PI;
    const at = (radius: number) => ({
      x: round(CENTRE + radius * Math.sin(angle)),
      y: round(CENTRE - radius * Math.cos(angle)),
    });
    if (bit === '0') return { kind: 'dot', ...at(DOT_AT) };
    const from = at(STROKE_FROM);
    const to = at(STROKE_TO);
    return { kind: 'stroke', x1: from.x, y1: from.y, x2: to.x, y2: to.y };
  });
}

function round(value: number): number {
  return Math.round(value * 100) / 100;
}
