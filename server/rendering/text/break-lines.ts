import { FORBIDDEN, FORCED, isForcedBreak, type ParagraphItem } from './paragraph-items.ts';

/** A line: items from `from` up to, not including, `to`; `ratio` says how far its glue is stretched or shrunk. */
export interface LineBreak {
  readonly from: number;
  readonly to: number;
  readonly ratio: number;
}

/** How lines are judged. */
export interface LineRules {
  /** Width of every line. */
  readonly width: number;
  /** Largest stretch a line may take; above it there is no solution. */
  readonly tolerance: number;
  /** For lines that end ragged: the shortfall that counts as a ratio of 1. Null: lines are justified. */
  readonly raggedness: number | null;
}

const FLAGGED_PAIR = 5_000;
const CLASS_JUMP = 3_000;
const LINE_PENALTY = 10;
/** Demerits of a line that is too full because nothing fits. */
const OVERFULL = 1e8;
const OVERFULL_FROM = 1e3;

interface Node {
  readonly at: number;
  /** First item of the line that would follow. */
  readonly next: number;
  readonly demerits: number;
  readonly fitness: number;
  readonly flagged: boolean;
  readonly before: Node | null;
  readonly ratio: number;
}

/**
 * Breaks a paragraph where the sum of demerits over all its lines is least.
 *
 * @param items - the paragraph; it ends with glue that fills the last line and a forced break
 * @returns the lines, or null when no set of breaks keeps within the tolerance; from a tolerance of 1000 there is
 *   always one, if need be with a line that is too full
 */
export function breakLines(
  items: readonly ParagraphItem<unknown>[],
  rules: LineRules,
): readonly LineBreak[] | null {
  const sums = prefixSums(items);
  let active: Node[] = [
    { at: -1, next: skipTo(items, 0), demerits: 0, fitness: 1, flagged: false, before: null, ratio: 0 },
  ];
  for (let i = 0; i < items.length; i++) {
    if (!isLegalBreak(items, i)) continue;
    const item = items[i];
    const forced = isForcedBreak(item);
    const best = new Map<number, Node>();
    const kept: Node[] = [];
    let dropped: Node | null = null;
    for (const node of active) {
      const ratio = stretchRatio(sums, node.next, i, item, rules);
      if (ratio < -1) dropped = node;
      else if (!forced) kept.push(node);
      if (ratio < -1 || ratio > rules.tolerance) continue;
      const candidate = follow(node, i, items, ratio);
      const known = best.get(candidate.fitness);
      if (!known || candidate.demerits < known.demerits) best.set(candidate.fitness, candidate);
    }
    active = [...kept, ...best.values()];
    if (active.length === 0) {
      if (!dropped || rules.tolerance < OVERFULL_FROM) return null;
      active = [{ ...follow(dropped, i, items, -1), demerits: dropped.demerits + OVERFULL }];
    }
  }
  return traceBack(active, items.length - 1);
}

interface Sums {
  readonly width: readonly number[];
  readonly stretch: readonly number[];
  readonly shrink: readonly number[];
}

function prefixSums(items: readonly ParagraphItem<unknown>[]): Sums {
  const width = [0];
  const stretch = [0];
  const shrink = [0];
  items.forEach((item, i) => {
    width.push((width[i] ?? 0) + (item.kind === 'penalty' ? 0 : item.width));
    stretch.push((stretch[i] ?? 0) + (item.kind === 'glue' ? item.stretch : 0));
    shrink.push((shrink[i] ?? 0) + (item.kind === 'glue' ? item.shrink : 0));
  });
  return { width, stretch, shrink };
}

function isLegalBreak(items: readonly ParagraphItem<unknown>[], i: number): boolean {
  const item = items[i];
  if (item?.kind === 'penalty') return item.cost < FORBIDDEN;
  return item?.kind === 'glue' && items[i - 1]?.kind === 'box';
}

/** Glue and idle penalties at the beginning of a line vanish. */
function skipTo(items: readonly ParagraphItem<unknown>[], from: number): number {
  let i = from;
  while (i < items.length && items[i]?.kind !== 'box' && !isForcedBreak(items[i])) i += 1;
  return i;
}

/** Within this much of fitting, a line fits. */
const ROUNDING = 1e-6;

function stretchRatio(
  sums: Sums,
  from: number,
  to: number,
  item: ParagraphItem<unknown> | undefined,
  rules: LineRules,
): number {
  const between = (values: readonly number[]) => (values[to] ?? 0) - (values[from] ?? 0);
  const natural = between(sums.width) + (item?.kind === 'penalty' ? item.width : 0);
  const slack = rules.width - natural;
  if (Math.abs(slack) <= ROUNDING) return 0;
  if (slack < 0) {
    const shrink = rules.raggedness === null ? between(sums.shrink) : 0;
    return shrink > 0 && -slack <= shrink + ROUNDING ? slack / shrink : -Infinity;
  }
  const stretch = between(sums.stretch) + (rules.raggedness ?? 0);
  if (stretch > 0) return slack / stretch;
  // A word alone cannot be stretched; where anything goes it may stand short.
  return rules.tolerance < OVERFULL_FROM ? Infinity : OVERFULL_FROM;
}

function fitnessOf(ratio: number): number {
  if (ratio < -0.5) return 0;
  if (ratio <= 0.5) return 1;
  return ratio <= 1 ? 2 : 3;
}

function follow(node: Node, at: number, items: readonly ParagraphItem<unknown>[], ratio: number): Node {
  const item = items[at];
  const cost = item?.kind === 'penalty' ? item.cost : 0;
  const flagged = item?.kind === 'penalty' && item.flagged;
  const fitness = fitnessOf(ratio);
  const badness = LINE_PENALTY + 100 * Math.abs(ratio) ** 3;
  let demerits = cost >= 0 ? (badness + cost) ** 2 : badness ** 2 - (cost > FORCED ? cost ** 2 : 0);
  if (flagged && node.flagged) demerits += FLAGGED_PAIR;
  if (Math.abs(fitness - node.fitness) > 1) demerits += CLASS_JUMP;
  return {
    at,
    next: skipTo(items, at + 1),
    demerits: node.demerits + demerits,
    fitness,
    flagged,
    before: node,
    ratio,
  };
}

function traceBack(active: readonly Node[], end: number): readonly LineBreak[] | null {
  const finished = active.filter((node) => node.at === end);
  let node = finished.reduce<Node | null>(
    (best, one) => (best === null || one.demerits < best.demerits ? one : best),
    null,
  );
  if (!node) return null;
  const lines: LineBreak[] = [];
  while (node.before) {
    lines.unshift({ from: node.before.next, to: node.at, ratio: node.ratio });
    node = node.before;
  }
  return lines;
}
