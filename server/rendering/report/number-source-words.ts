import type { Evidence, ValueReference } from '#shared/evidence/evidence.ts';
import { findValue } from '#shared/evidence/find-value.ts';
import type { Findings, Scalar } from '#shared/evidence/findings.ts';
import { registerOf } from '#shared/evidence/register.ts';
import { describeSource, type EvaluatedFreedom } from '#shared/evidence/sources.ts';
import { countInWords } from '#shared/evidence/words.ts';
import type { NumberSource, NumberSources } from './number-sources.ts';

/** Where a number comes from and how it was reduced, each in a few words. */
export interface SourceWords {
  readonly source: string;
  readonly reduction: string;
}

interface Facts {
  readonly evidence: Evidence;
  readonly findings: Findings;
  readonly sources: NumberSources;
}

/** More trials than this are told as a range and a count. */
const MOST_NAMES = 6;
/** Smaller shares of u² are not told. */
const LEAST_SHARE = 0.01;
/** Only the words of a source are asked for here. */
const FREEDOM: EvaluatedFreedom = { ofMean: () => Infinity, ofFit: () => Infinity };

export function sourceWords(number: NumberSource, facts: Facts): SourceWords {
  const value = findValue(facts.findings, facts.evidence, number.ref);
  if (value.shape === 'fault') return { source: value.sentence, reduction: '' };
  return wordsOf(number.ref, value, facts);
}

function wordsOf(ref: ValueReference, value: Scalar, facts: Facts): SourceWords {
  switch (ref.kind) {
    case 'mean':
      return meanWords(value, facts);
    case 'quantity':
      return quantityWords(ref.quantity, value, facts);
    case 'prediction':
      return { source: modelName(ref.model, facts), reduction: shares(value, facts) };
    case 'reading':
      return { source: trialNames([ref.trial], facts), reduction: 'one reading' };
    case 'fit':
      return { source: comparisonName(ref.comparison, facts), reduction: ref.figure };
    case 'claim':
      return { source: `claim ${claimNumber(ref.claim, facts)}`, reduction: claimFigure(ref.figure) };
    case 'count':
      return { source: countedTrials(ref, facts), reduction: 'counted' };
    case 'difference':
      return {
        source: `${nameOf(ref.a, facts)} less ${nameOf(ref.b, facts)}`,
        reduction: inUncertainties(value),
      };
  }
}

function meanWords(value: Scalar, facts: Facts): SourceWords {
  const { madeOf } = value;
  if (madeOf.kind !== 'mean') return { source: 'trials', reduction: shares(value, facts) };
  const left = madeOf.leftOut.length > 0 ? `; ${trialNames(madeOf.leftOut, facts)} excluded` : '';
  const mean = madeOf.trials.length === 1 ? 'one trial' : `mean of ${madeOf.trials.length}`;
  return { source: trialNames(madeOf.trials, facts) + left, reduction: `${mean}; ${shares(value, facts)}` };
}

function quantityWords(id: string, value: Scalar, facts: Facts): SourceWords {
  const quantity = facts.evidence.quantities.find((row) => row.id === id);
  if (!quantity) return { source: '', reduction: '' };
  const { madeOf } = value;
  if (madeOf.kind === 'fit') return fitWords(madeOf.comparison, facts);
  if (madeOf.kind === 'expression') return { source: quantity.name, reduction: shares(value, facts) };
  if (madeOf.kind === 'summary') {
    return { source: trialNames(madeOf.trials, facts), reduction: madeOf.stat };
  }
  if (madeOf.kind === 'mean') return meanWords(value, facts);
  const instrument = quantity.def.origin === 'constant' ? quantity.def.instrument : undefined;
  const byInstrument = facts.evidence.instruments.find((row) => row.id === instrument)?.name;
  return { source: quantity.name, reduction: quantity.source ?? byInstrument ?? quantity.status };
}

function fitWords(id: string, facts: Facts): SourceWords {
  const row = facts.evidence.comparisons.find((one) => one.id === id);
  const finding = facts.findings.comparisons.get(id);
  const letters = (row?.selection.series ?? []).map(
    (series) => facts.evidence.series.find((one) => one.id === series)?.letter ?? '',
  );
  const used = finding?.used.length ?? 0;
  const all = used + (finding?.outside.length ?? 0);
  const free = row?.free.length ?? 0;
  const parameters = `${countInWords(free)} free parameter${free === 1 ? '' : 's'}`;
  const trials = used === all ? `${used} trials` : `${used} of ${all} trials`;
  return { source: `series ${letters.join(', ')}, ${trials}`, reduction: `fit, ${parameters}` };
}

function modelName(id: string, { evidence }: Facts): string {
  const model = evidence.models.find((row) => row.id === id);
  return model ? `model ${model.n}` : 'model';
}

function comparisonName(id: string, { evidence }: Facts): string {
  const row = evidence.comparisons.find((one) => one.id === id);
  return row?.name === undefined || row.name === '' ? 'comparison' : row.name;
}

function claimNumber(id: string, { evidence }: Facts): string {
  return String(evidence.claims.find((row) => row.id === id)?.n ?? '');
}

function claimFigure(figure: 'z' | 'difference' | 'k'): string {
  if (figure === 'z') return 'difference over its uncertainty';
  return figure === 'k' ? 'its margin' : 'measured less expected';
}

function countedTrials(ref: Extract<ValueReference, { kind: 'count' }>, facts: Facts): string {
  const what = { trials: 'trials', kept: 'kept trials', excluded: 'excluded trials', used: 'trials used' }[
    ref.of
  ];
  const series = facts.evidence.series.find((row) => row.id === ref.series);
  if (series) return `${what} of series ${series.letter}`;
  return ref.comparison === undefined ? what : `${what} in ${comparisonName(ref.comparison, facts)}`;
}

/** The letter of a number that stands in the report, else what it is. */
function nameOf(ref: ValueReference, facts: Facts): string {
  const letter = facts.sources.find(ref);
  if (letter !== null) return letter;
  const value = findValue(facts.findings, facts.evidence, ref);
  return value.shape === 'fault' ? 'a missing value' : wordsOf(ref, value, facts).source;
}

function inUncertainties(value: Scalar): string {
  if (value.u === null || value.u === 0) return '';
  return `${Math.abs(value.value / value.u).toFixed(1)} u`;
}

/** "fit to series A 85 %, steel rule 15 % of u²": sources with the same words together, the largest first. */
function shares(value: Scalar, { evidence, findings }: Facts): string {
  const register = registerOf(evidence);
  const total = value.parts.reduce((sum, part) => sum + part.c * part.c, 0);
  if (!(total > 0)) return '';
  const byWords = new Map<string, number>();
  for (const part of value.parts) {
    const words =
      findings.sources.get(part.source)?.words ?? describeSource(register, part.source, FREEDOM).words;
    byWords.set(words, (byWords.get(words) ?? 0) + (part.c * part.c) / total);
  }
  const told = [...byWords]
    .filter(([, share]) => share >= LEAST_SHARE)
    .toSorted((a, b) => b[1] - a[1])
    .slice(0, 3)
    .map(([words, share]) => `${words} ${Math.round(share * 100)}\u202f%`);
  return `${told.join(', ')} of u²`;
}

/** "B10, B12, B13", or "B1 to B9, 9 trials" where there are many. */
function trialNames(ids: readonly string[], { evidence }: Facts): string {
  const names = ids.flatMap((id) => {
    const trial = evidence.trials.find((row) => row.id === id);
    const letter = evidence.series.find((row) => row.id === trial?.series)?.letter ?? '';
    return trial ? [`${letter}${trial.number}`] : [];
  });
  if (names.length <= MOST_NAMES) return names.join(', ');
  return `${names[0] ?? ''} to ${names.at(-1) ?? ''}, ${names.length} trials`;
}
