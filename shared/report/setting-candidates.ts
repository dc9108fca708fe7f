import type { Evidence, Quantity, Series } from '#shared/evidence/evidence.ts';
import { isFault } from '#shared/evidence/fault.ts';
import { findValue } from '#shared/evidence/find-value.ts';
import type { Findings, Group } from '#shared/evidence/findings.ts';
import { quantityKey } from '#shared/evidence/keys.ts';
import { newestModelOf } from './newest-model.ts';
import { nearness, type SentenceHints } from './sentence-hints.ts';
import { settingWords } from './setting-words.ts';
import type { Candidate } from './value-options.ts';

/** Settings of one series that are looked up, nearest to the sentence first; the rest is found by naming it. */
const MOST_SETTINGS = 24;

/**
 * A quantity's means, predictions and shortfalls at the settings of every series that has it.
 *
 * @param hints - what the sentence names
 */
export function settingCandidates(
  quantity: Quantity,
  evidence: Evidence,
  findings: Findings,
  hints: SentenceHints,
): readonly Candidate[] {
  const model = newestModelOf(quantity.id, evidence)?.id ?? null;
  const homes = evidence.series.filter((series) => hasColumn(quantity.id, series, findings));
  return homes.flatMap((series) => {
    const groups = [...(findings.groups.get(series.id) ?? [])]
      .map((group) => ({ group, distance: nearness(group.settings, hints) }))
      .sort((a, b) => (a.distance === b.distance ? 0 : a.distance - b.distance))
      .slice(0, MOST_SETTINGS);
    const suffix = homes.length > 1 ? `, series ${series.letter}` : '';
    return groups.flatMap(({ group, distance }) =>
      atSetting({ quantity, series, model, group, distance, suffix }, evidence, findings),
    );
  });
}

interface Place {
  readonly quantity: Quantity;
  readonly series: Series;
  readonly model: string | null;
  readonly group: Group;
  readonly distance: number;
  readonly suffix: string;
}

function atSetting(place: Place, evidence: Evidence, findings: Findings): readonly Candidate[] {
  const { quantity, series, model, group, distance, suffix } = place;
  const where = settingWords(group.settings, evidence);
  const words = (of: string) => (where === '' ? `${of}${suffix}` : `${of} at ${where}${suffix}`);
  const isSetting = series.settings.includes(quantity.id);
  const common = { quantity: quantity.id, series: series.id, at: group.settings };
  const mean = { kind: 'mean', ...common } as const;
  const candidates: Candidate[] =
    group.kept.length === 0
      ? []
      : [{ ref: mean, words: words(isSetting ? 'as set' : meanWords(group)), kind: 'mean', distance }];
  if (model === null || isSetting) return candidates;
  const prediction = { kind: 'prediction', model, ...common } as const;
  candidates.push({ ref: prediction, words: words('predicted'), kind: 'predicted', distance });
  if (group.kept.length === 0) return candidates;
  const difference = findValue(findings, evidence, { kind: 'difference', a: prediction, b: mean });
  if (isFault(difference)) return candidates;
  const isShort = difference.value >= 0;
  candidates.push({
    ref: isShort
      ? { kind: 'difference', a: prediction, b: mean }
      : { kind: 'difference', a: mean, b: prediction },
    words: words(isShort ? 'short of the model' : 'beyond the model'),
    kind: 'difference',
    distance,
  });
  return candidates;
}

function meanWords({ kept }: Group): string {
  return kept.length === 1 ? 'the one trial' : 'mean';
}

function hasColumn(quantity: string, series: Series, findings: Findings): boolean {
  if (series.settings.includes(quantity) || series.readings.includes(quantity)) return true;
  return findings.values.get(quantityKey(quantity, series.id))?.shape === 'column';
}
