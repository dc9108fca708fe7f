import type { Evidence, Quantity } from './evidence.ts';
import type { Fault, MadeOf } from './findings.ts';
import { registerOf, type Register } from './register.ts';
import type { Uncertain } from './uncertain.ts';

/** What a node was made from, and what came out. */
export interface CachedNode {
  readonly inputs: readonly unknown[];
  readonly value: unknown;
}

/** What one evaluation leaves for the next, so that only what changed is computed anew. Keep one for each problem. */
export interface EvaluationCache {
  nodes: ReadonlyMap<string, CachedNode>;
}

/** An empty cache. */
export function createEvaluationCache(): EvaluationCache {
  return { nodes: new Map() };
}

/** A node as the evaluation before left it. */
export interface Earlier<T> {
  readonly inputs: readonly unknown[];
  readonly value: T;
}

/** A quantity found by a fit or a statistic. */
export interface Solved {
  readonly uncertain: Uncertain;
  readonly madeOf: MadeOf;
  readonly warnings: readonly string[];
  /** Degrees of freedom of the scatter that stands behind it; Infinity for a fit whose weights are believed. */
  readonly degreesOfFreedom: number;
}

/** How quantities come by their values that neither trials nor expressions give. */
export interface Solvers {
  readonly fitted: (run: Evaluation, quantity: Quantity) => Solved | Fault;
  readonly summary: (run: Evaluation, quantity: Quantity) => Solved | Fault;
  /** Degrees of freedom of a comparison's statistical parts. */
  readonly fitFreedom: (run: Evaluation, comparison: string) => number;
}

/**
 * One run over a problem's evidence. Every intermediate result is a node: it is made once a run, and taken from
 * the run before when each of its inputs is the very same object. Results that come out equal keep their old
 * identity, so that a change stops where it no longer matters.
 */
export class Evaluation {
  readonly register: Register;
  readonly #earlier: ReadonlyMap<string, CachedNode>;
  readonly #nodes = new Map<string, CachedNode>();

  constructor(
    evidence: Evidence,
    cache: EvaluationCache,
    readonly solvers: Solvers,
  ) {
    this.register = registerOf(evidence);
    this.#earlier = cache.nodes;
  }

  get evidence(): Evidence {
    return this.register.evidence;
  }

  get nodes(): ReadonlyMap<string, CachedNode> {
    return this.#nodes;
  }

  /**
   * The value of a node.
   *
   * @param key - names the node and the type of its value: one key, one type
   * @param inputs - everything the value depends on; asked for once a run
   * @param compute - may return the earlier value itself when the new one is equal
   */
  node<T>(key: string, inputs: () => readonly unknown[], compute: (earlier: Earlier<T> | undefined) => T): T {
    const made = this.#nodes.get(key);
    if (made !== undefined) return made.value as T;
    const from = inputs();
    const earlier = this.#earlier.get(key) as (CachedNode & Earlier<T>) | undefined;
    const value = earlier !== undefined && sameItems(earlier.inputs, from) ? earlier.value : compute(earlier);
    this.#nodes.set(key, { inputs: from, value });
    return value;
  }
}

/** Whether two lists hold the very same things in the same order. */
export function sameItems(a: readonly unknown[], b: readonly unknown[]): boolean {
  return a.length === b.length && a.every((element, i) => Object.is(element, b[i]));
}
