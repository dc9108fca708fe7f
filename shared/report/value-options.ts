/** What a symbol may mean: the values that a writer can tie, nearest to the sentence first. */
import type { Evidence, Quantity, ValueReference } from '#shared/evidence/evidence.ts';
import { keyOf } from '#shared/evidence/keys.ts';
import type { Findings, Hue } from '#shared/evidence/findings.ts';
import { sameSymbol, splitSymbol, symbolToText } from '#shared/formatting/symbol.ts';
import { showValue } from './live-value.ts';
import { sentenceHints, type SentenceHints } from './sentence-hints.ts';
import { settingCandidates } from './setting-candidates.ts';

/** One value that may be tied. */
export interface ValueOption {
  readonly key: string;
  readonly ref: ValueReference;
  /** "mean at 45°", "predicted at 45°", "largest range", "short of the model at 45°". */
  readonly words: string;
  /** "44.8 ± 0.4 cm". */
  readonly text: string;
  readonly hue: Hue;
  readonly quantity: string | null;
}

/** A value that might be offered, before it is looked up. */
export interface Candidate {
  readonly ref: ValueReference;
  readonly words: string;
  /** What it is about, for the order. */
  readonly kind: 'mean' | 'predicted' | 'single' | 'difference' | 'figure';
  /** Place of its setting in the sentence: 0 is nearest; Infinity: not named. */
  readonly distance: number;
}

/**
 * The quantity that a typed symbol names; `theta` and `θ` are one, and `Cv` finds C_v.
 *
 * @returns null when no quantity has that symbol
 */
export function quantityOfSymbol(typed: string, evidence: Evidence): Quantity | null {
  const exact = evidence.quantities.find(({ symbol }) => sameSymbol(symbol, typed));
  if (exact !== undefined) return exact;
  const plain = typed.replace('_', '');
  return evidence.quantities.find(({ symbol }) => symbolToText(symbol).replace('_', '') === plain) ?? null;
}

/**
 * Every value that can be tied to one symbol: its means by setting, its predictions, its shortfalls, the values of
 * the register that share its letter (a largest value among them), and the figures of its fits.
 *
 * @param symbol - as it was typed
 * @param contextText - the sentence so far; settings named in it come first
 * @returns nearest first; empty when nothing has that symbol
 */
export function optionsForSymbol(
  symbol: string,
  evidence: Evidence,
  findings: Findings,
  contextText: string,
): readonly ValueOption[] {
  const quantity = quantityOfSymbol(symbol, evidence);
  if (quantity === null) return [];
  const hints = sentenceHints(contextText);
  const candidates = [
    ...settingCandidates(quantity, evidence, findings, hints),
    ...relatives(quantity, evidence).flatMap((one) => registerCandidates(one, quantity, evidence, findings)),
    ...readingCandidates(quantity, evidence, hints),
    ...figureCandidates(quantity, evidence),
  ];
  return toOptions(inOrder(candidates, hints), evidence, findings);
}

/**
 * Looks candidates up and leaves out those without a value, and those that stand in the list already.
 *
 * @param candidates - in the order they are offered
 */
export function toOptions(
  candidates: readonly Candidate[],
  evidence: Evidence,
  findings: Findings,
): readonly ValueOption[] {
  const options = new Map<string, ValueOption>();
  for (const { ref, words } of candidates) {
    const key = keyOf(ref);
    if (options.has(key)) continue;
    const shown = showValue(ref, 'value', null, evidence, findings);
    if (shown.state === 'fault') continue;
    const quantity = 'quantity' in ref ? ref.quantity : null;
    options.set(key, { key, ref, words, text: shown.text, hue: shown.hue, quantity });
  }
  return [...options.values()];
}

function inOrder(candidates: readonly Candidate[], hints: SentenceHints): readonly Candidate[] {
  return candidates
    .map((candidate, i) => ({ candidate, i, rank: rank(candidate, hints) }))
    .sort((a, b) => distance(a.candidate) - distance(b.candidate) || a.rank - b.rank || a.i - b.i)
    .map(({ candidate }) => candidate);
}

/** Settings that are not named stand after all that are, and after values without a setting. */
function distance({ distance: place }: Candidate): number {
  return place === Infinity ? 1e9 : place;
}

const ORDER: readonly Candidate['kind'][] = ['mean', 'predicted', 'difference', 'single', 'figure'];

function rank({ kind }: Candidate, { leaning }: SentenceHints): number {
  if (kind === leaning || (kind === 'mean' && leaning === 'measured')) return -1;
  return ORDER.indexOf(kind);
}

/** The quantity itself, and those that have its letter with another label: R and R_max. */
function relatives(quantity: Quantity, evidence: Evidence): readonly Quantity[] {
  const parts = splitSymbol(quantity.symbol);
  if (parts === null || parts.sub !== null) return [quantity];
  const letter = evidence.quantities.filter(
    (other) => other.id !== quantity.id && splitSymbol(other.symbol)?.letter === parts.letter,
  );
  return [quantity, ...letter.filter(({ unit }) => unit === quantity.unit)];
}

function registerCandidates(
  one: Quantity,
  asked: Quantity,
  evidence: Evidence,
  findings: Findings,
): readonly Candidate[] {
  const own = one.id === asked.id;
  const single: Candidate = {
    ref: { kind: 'quantity', quantity: one.id },
    words: own ? originWords(one, evidence) : one.name,
    kind: 'single',
    distance: own ? 0 : 1e6,
  };
  const inSeries = evidence.series
    .filter(({ id, held }) => one.id in held || findings.values.get(`${one.id}@${id}`)?.shape === 'scalar')
    .map(({ id, letter }): Candidate => ({
      ref: { kind: 'quantity', quantity: one.id, series: id },
      words: own ? `in series ${letter}` : `${one.name}, series ${letter}`,
      kind: 'single',
      distance: 1e6,
    }));
  return [single, ...inSeries];
}

function originWords(quantity: Quantity, evidence: Evidence): string {
  switch (quantity.def.origin) {
    case 'constant':
      return quantity.status === 'measured' ? 'measured' : quantity.status;
    case 'fitted': {
      const { comparison } = quantity.def;
      const name = evidence.comparisons.find(({ id }) => id === comparison)?.name ?? '';
      return name === '' ? 'fitted' : `fitted: ${name}`;
    }
    case 'predicted': {
      const { model } = quantity.def;
      const n = evidence.models.find(({ id }) => id === model)?.n;
      return n === undefined ? 'predicted' : `predicted by model ${n}`;
    }
    case 'summary':
      return quantity.def.stat;
    case 'derived':
      return 'worked out';
    case 'recorded':
      return quantity.name;
  }
}

function readingCandidates(
  quantity: Quantity,
  evidence: Evidence,
  { trials }: SentenceHints,
): readonly Candidate[] {
  return trials.flatMap((name, place) => {
    const letters = /^[A-Z]+/u.exec(name)?.[0] ?? '';
    const series = evidence.series.find(({ letter }) => letter === letters);
    const trial = evidence.trials.find(
      (row) => row.series === series?.id && row.number === Number(name.slice(letters.length)),
    );
    if (trial === undefined || !(quantity.id in trial.values)) return [];
    return [
      {
        ref: { kind: 'reading' as const, trial: trial.id, quantity: quantity.id },
        words: `trial ${name} alone`,
        kind: 'mean' as const,
        distance: place,
      },
    ];
  });
}

function figureCandidates(quantity: Quantity, evidence: Evidence): readonly Candidate[] {
  const models = new Set(evidence.models.filter(({ output }) => output === quantity.id).map(({ id }) => id));
  const about = evidence.comparisons.filter(
    ({ model, free }) => models.has(model) || free.some((one) => one.quantity === quantity.id),
  );
  return about.flatMap(({ id, name }) =>
    (['chi-squared', 'degrees of freedom', 'p-value', 'worst z'] as const).map((figure): Candidate => ({
      ref: { kind: 'fit', comparison: id, figure },
      words: `${figure === 'worst z' ? 'worst difference in u' : figure}, ${name}`,
      kind: 'figure',
      distance: 2e9,
    })),
  );
}
