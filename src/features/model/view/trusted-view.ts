import type { Evidence, Model, Reading } from '#shared/evidence/evidence.ts';
import { unitToText } from '#shared/formatting/unit-text.ts';
import { sayList } from '#src/lib/say/say-list.ts';

/** "the head is 4 to 20 cm and the lean 0 to 60°. Below 4 cm the jet clings. Drag and swirl are left out." */
export function trustedSentences(model: Model, evidence: Evidence): string[] {
  const ranges = model.limits.flatMap((limit) => {
    const quantity = evidence.quantities.find(({ id }) => id === limit.quantity);
    const words = rangeWords(limit.min, limit.max);
    return quantity && words ? [`the ${quantity.name} is ${words}`] : [];
  });
  const reasons = model.limits.flatMap(({ reason }) => (reason ? [asSentence(reason)] : []));
  const leftOut = model.assumptions.flatMap(({ neglects }) => (neglects ? [neglects] : []));
  const where =
    ranges.length > 0 ? `Where ${sayList(ranges)}.` : 'No limit is stated; say where the model may be used.';
  const out =
    leftOut.length > 0
      ? [`${capital(sayList(leftOut))} ${leftOut.length === 1 ? 'is' : 'are'} left out.`]
      : [];
  return [where, ...reasons, ...out];
}

function rangeWords(min: Reading | null, max: Reading | null): string | null {
  if (min && max) {
    return min.unit === max.unit ? `${min.text} to ${withUnit(max)}` : `${withUnit(min)} to ${withUnit(max)}`;
  }
  if (min) return `${withUnit(min)} or more`;
  return max ? `${withUnit(max)} or less` : null;
}

function withUnit({ text, unit }: Reading): string {
  if (unit === '1') return text;
  return unit === '°' ? `${text}°` : `${text}\u00a0${unitToText(unit)}`;
}

const capital = (text: string) => `${text.charAt(0).toUpperCase()}${text.slice(1)}`;
const asSentence = (text: string) => capital(text.trim().replace(/\.?$/, '.'));
