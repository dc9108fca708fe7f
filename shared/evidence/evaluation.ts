import type { Evidence, Quantity } from './evidence.ts';
import type { Fault, MadeOf } from './findings.ts';
import { registerOf, type Register } from './register.ts';
import type { Uncertain } from './uncertain.ts';

/** What a node was made from, what came out, and the run that last found it valid. */
interface CachedNode {
  readonly inputs: readonly unknown[];
  readonly value: unknown;
  run: number;
}

/** What one evaluation leaves for the next, so that only what changed is computed anew. Keep one for each problem. */
export interface EvaluationCache {
  readonly nodes: Map<string, CachedNode>;
  /** Evaluations made with it. */
  runs: number;
}

/** An empty cache. */
export function createEvaluationCache(): EvaluationCache {
  return { nodes: new Map(), runs: 0 };
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
  readonly #nodes: Map<string, CachedNode>;
  readonly #run: number;

  constructor(
    evidence: Evidence,
    cache: EvaluationCache,
    readonly solvers: Solvers,
  ) {
    this.register = registerOf(evidence);
    this.#nodes = cache.nodes;
    cache.runs += 1;
    this.#run = cache.runs;
  }

  get evidence(): Evidence {
    return this.register.evidence;
  }

  /**
   * The value of a node.
   *
   * @param key - names the node and the type of its value: one key, one type
   * @param inputs - everything the value depends on; asked for once a run
   * @param compute - may return the earlier value itself when the new one is equal
   */
  node<T>(key: string, inputs: () => readonly unknown[], compute: (earlier: Earlier<T> | undefined) => T): T {
    const known = this.#nodes.get(key);
    if (known?.run === this.#run) return known.value as T;
    const from = inputs();
    if (known !== undefined && sameItems(known.inputs, from)) {
      known.run = this.#run;
      return known.value as T;
    }
    const value = compute(known as Earlier<T> | undefined);
    this.#nodes.set(key, { inputs: from, value, run: this.#run });
    return value;
  }
}

/** Whether two lists hold the very same things in the same order. */
export function sameItems(a: readonly unknown[], b: readonly unknown[]): boolean {
  if (a.length !== b.length) return false;
  for (let i = 0; i < a.length; i++) if (!Object.is(a[i], b[i])) return false;
  return true;
}
