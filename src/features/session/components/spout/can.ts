import type { Spout } from './flight.ts';

/** Pixels for a centimetre, and where the spout stands in the drawing. */
const SCALE = 13;
const TABLE = 716;
const SPOUT_X = 330;

export type Point = readonly [x: number, y: number];

/** From centimetres beside the spout to the drawing. */
export function toDrawing(x: number, y: number): Point {
  return [SPOUT_X + SCALE * x, TABLE - SCALE * y];
}

export interface CanDrawing {
  readonly water: readonly Point[];
  readonly surface: readonly [Point, Point];
  /** The wall, open at the spout. */
  readonly walls: readonly (readonly Point[])[];
  readonly wedge: readonly Point[];
  /** The corner of the wedge, where the lean is measured. */
  readonly corner: Point;
}

interface Can {
  readonly width: number;
  readonly height: number;
  /** Spout above the bottom, along the wall. */
  readonly spout: number;
}

/** A can of these measures in centimetres, leaned on a wedge so that its spout stands where the flight begins. */
export function drawCan(can: Can, { lean, head, height }: Spout): CanDrawing {
  const up = { x: -Math.sin(lean), y: Math.cos(lean) };
  const across = { x: Math.cos(lean), y: Math.sin(lean) };
  const right = (along: number): Point =>
    toDrawing(up.x * (along - can.spout), height + up.y * (along - can.spout));
  const left = (along: number): Point => {
    const [x, y] = right(along);
    return [x - SCALE * can.width * across.x, y + SCALE * can.width * across.y];
  };
  const surfaceAlong = can.spout + head / up.y;
  const leftAlong = surfaceAlong + can.width * Math.tan(lean);
  const [bottomX, bottomY] = left(0);
  const corner: Point = [bottomX - (TABLE - bottomY) / Math.tan(lean), TABLE];
  const wedgeEnd = right(0)[0] + 22;
  const wedgeTop = TABLE - (wedgeEnd - corner[0]) * Math.tan(lean);
  return {
    water: [left(0), right(0), right(surfaceAlong), left(leftAlong)],
    surface: [left(leftAlong), right(surfaceAlong)],
    walls: [
      [left(can.height), left(0), right(0), right(can.spout - 0.38)],
      [right(can.spout + 0.38), right(can.height)],
    ],
    wedge: [corner, [wedgeEnd, wedgeTop], [wedgeEnd, TABLE]],
    corner,
  };
}

export function pathOf(points: readonly Point[]): string {
  return points.map(([x, y], i) => `${i === 0 ? 'M' : 'L'}${x.toFixed(1)} ${y.toFixed(1)}`).join('');
}
