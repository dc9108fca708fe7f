/** An upright rectangle on a chart, in CSS pixels. */
export interface Box {
  readonly left: number;
  readonly top: number;
  readonly right: number;
  readonly bottom: number;
}

/** A place that a label may take; `cost` says how gladly, 0 is best. */
export interface LabelCandidate {
  readonly box: Box;
  readonly cost: number;
}

/** How much of a label's area may be run over before it is better left out. */
const OVERLAP_COST = 1;

function overlap(a: Box, b: Box): number {
  const width = Math.min(a.right, b.right) - Math.max(a.left, b.left);
  const height = Math.min(a.bottom, b.bottom) - Math.max(a.top, b.top);
  return width > 0 && height > 0 ? width * height : 0;
}

/**
 * The best of several places for a label: inside the bounds, over as little as possible of what stands there already.
 *
 * @param candidates - places in order of liking; of equal ones the first is taken
 * @param taken - boxes of points, curve and labels already placed
 * @param bounds - the label must lie within
 * @returns the place, or null when every one is outside or runs over more than a twentieth of the label
 * @example placeLabel([{ box: { left: 0, top: 0, right: 4, bottom: 2 }, cost: 0 }], [], { left: 0, top: 0, right: 9, bottom: 9 })?.right // => 4
 */
export function placeLabel(
  candidates: readonly LabelCandidate[],
  taken: readonly Box[],
  bounds: Box,
): Box | null {
  let best: { box: Box; cost: number } | null = null;
  for (const { box, cost } of candidates) {
    const inside =
      box.left >= bounds.left &&
      box.right <= bounds.right &&
      box.top >= bounds.top &&
      box.bottom <= bounds.bottom;
    if (!inside) continue;
    const covered = taken.reduce((sum, other) => sum + overlap(box, other), 0);
    if (covered > ((box.right - box.left) * (box.bottom - box.top)) / 20) continue;
    const total = cost + covered * OVERLAP_COST;
    if (!best || total < best.cost) best = { box, cost: total };
  }
  return best?.box ?? null;
}
