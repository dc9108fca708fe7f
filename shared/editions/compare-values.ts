import { showValue } from '#shared/report/live-value.ts';
import type { ComparedSide } from './compare-editions.ts';
import type { EditionComparison, MovedValue } from './edition-comparison.ts';
import { tiedValues, type TiedValue } from './tied-values.ts';
import { valueWords } from './value-words.ts';
import { whyMoved } from './why-moved.ts';

/** Numbers tied in both reports whose shown text is another, in the reading order of the later one. */
export function compareValues(
  before: ComparedSide,
  after: ComparedSide,
): Pick<EditionComparison, 'values' | 'newlyTied' | 'noLongerTied'> {
  const earlier = tiedValues(before.document);
  const later = tiedValues(after.document);
  const values = [...later.values()].flatMap((tied) => {
    const moved = earlier.has(tied.key) ? movedValue(tied, before, after) : null;
    return moved === null ? [] : [moved];
  });
  const missingIn = (keys: ReadonlyMap<string, unknown>, others: ReadonlyMap<string, unknown>) =>
    [...keys.keys()].filter((key) => !others.has(key)).length;
  return { values, newlyTied: missingIn(later, earlier), noLongerTied: missingIn(earlier, later) };
}

function movedValue(tied: TiedValue, before: ComparedSide, after: ComparedSide): MovedValue | null {
  const { key, ref, unit, section } = tied;
  const show = ({ evidence, findings }: ComparedSide) => showValue(ref, 'value', unit, evidence, findings);
  const was = show(before);
  const is = show(after);
  if (was.text === is.text) return null;
  return {
    key,
    name: valueWords(ref, after.evidence),
    hue: is.hue,
    before: was.text,
    after: is.text,
    why: whyMoved(ref, before, after),
    section,
  };
}
