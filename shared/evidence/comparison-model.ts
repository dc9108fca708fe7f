import { at } from '#shared/numeric/element.ts';
import type { ComparisonData } from './comparison-data.ts';
import { isFault } from './fault.ts';
import type { Register } from './register.ts';
import { createScope } from './scope.ts';
import { rowOf, type Term, type Uncertain } from './uncertain.ts';

/** What is followed through the model besides its values. */
export type Followed =
  'nothing' | 'parameters' | 'own errors' | 'parameters and own errors' | 'shared errors';

/** A small move of one shared source: by how much of its standard uncertainty. */
export interface SourceMove {
  readonly source: string;
  readonly by: number;
}

/** The model over the used trials, as a function of the parameters. */
export interface ComparisonModel {
  readonly rows: number;
  /** Prediction at some parameters; what cannot be had is NaN. */
  predict(parameters: Float64Array, followed: Followed, move?: SourceMove): Uncertain;
  /** The measured side, moved with the source. */
  measured(move?: SourceMove): Float64Array;
}

/** Name of a parameter as a source: its contribution is the derivative by it. */
export function parameterSource(index: number): string {
  return `parameter:${index}`;
}

/** Makes the model of a comparison ready to be run again and again. */
export function comparisonModel(register: Register, data: ComparisonData): ComparisonModel {
  const rows = data.used.length;
  const index = new Map(data.free.map(({ quantity }, i) => [quantity, i]));
  const missing: Uncertain = {
    values: new Float64Array(rows).fill(NaN),
    terms: [],
    known: false,
    hue: 'predicted',
  };

  function predict(parameters: Float64Array, followed: Followed, move?: SourceMove): Uncertain {
    const scope = createScope(register, rows, (id) => {
      const i = index.get(id);
      if (i !== undefined) return parameter(at(parameters, i), i, followed);
      const leaf = data.leaves.get(id);
      return leaf === undefined
        ? null
        : { ...moved(leaf, move), terms: leaf.terms.filter((term) => follows(term, followed)) };
    });
    const value = scope.find(data.model.output, data.model.id);
    return isFault(value) ? missing : value;
  }

  return { rows, predict, measured: (move) => moved(data.measured, move).values };
}

function parameter(value: number, index: number, followed: Followed): Uncertain {
  const follow = followed === 'parameters' || followed === 'parameters and own errors';
  const terms: Term[] = follow
    ? [{ source: parameterSource(index), kind: 'shared', c: Float64Array.of(1) }]
    : [];
  return { values: Float64Array.of(value), terms, known: false, hue: 'predicted' };
}

function follows({ kind }: Term, followed: Followed): boolean {
  if (kind === 'shared') return followed === 'shared errors';
  return (
    followed === 'own errors' || followed === 'parameters and own errors' || followed === 'shared errors'
  );
}

function moved(value: Uncertain, move: SourceMove | undefined): Uncertain {
  if (move === undefined) return value;
  const term = value.terms.find(({ source, kind }) => kind === 'shared' && source === move.source);
  if (term === undefined) return value;
  const rows = Math.max(value.values.length, term.c.length);
  const values = Float64Array.from(
    { length: rows },
    (_, row) => rowOf(value.values, row) + move.by * rowOf(term.c, row),
  );
  return { ...value, values };
}

/** The column of one source in a result, spread over all rows; zeros where the result does not follow it. */
export function columnOfSource(
  value: Uncertain,
  source: string,
  kind: Term['kind'],
  rows: number,
): Float64Array {
  const term = value.terms.find((one) => one.source === source && one.kind === kind);
  const column = new Float64Array(rows);
  if (term !== undefined) for (let row = 0; row < rows; row++) column[row] = rowOf(term.c, row);
  return column;
}

/** Sources that are independent from trial to trial on the model's side. */
export function ownSources(data: ComparisonData): readonly Term[] {
  const sources = new Map<string, Term>();
  for (const leaf of data.leaves.values())
    for (const term of leaf.terms)
      if (term.kind !== 'shared') sources.set(`${term.kind}:${term.source}`, term);
  return [...sources.values()];
}

/** Names of the sources common to trials, on either side. */
export function sharedSources(data: ComparisonData): readonly string[] {
  const sources = new Set<string>();
  for (const value of [data.measured, ...data.leaves.values()])
    for (const { kind, source } of value.terms) if (kind === 'shared') sources.add(source);
  return [...sources];
}

/** How the residual (predicted − measured) follows one source that is independent from trial to trial. */
export function residualSlope(
  data: ComparisonData,
  predicted: readonly Term[],
  source: string,
  kind: Term['kind'],
  rows: number,
): Float64Array {
  const side = (terms: readonly Term[]) => terms.find((term) => term.source === source && term.kind === kind);
  const [model, measured] = [side(predicted), side(data.measured.terms)];
  const slope = new Float64Array(rows);
  for (let row = 0; row < rows; row++)
    slope[row] =
      (model === undefined ? 0 : rowOf(model.c, row)) - (measured === undefined ? 0 : rowOf(measured.c, row));
  return slope;
}
