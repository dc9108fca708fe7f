import type { Edition } from '#shared/contracts/editions.ts';
import { dayAndShortMonth, timeOfDay } from '#src/lib/dates/say-date.ts';
import { countOf } from '#src/lib/say/count-of.ts';

/** "28 Feb, 17:40, by Ines Farrow" */
export function frozenWords({ at, by }: Pick<Edition, 'at' | 'by'>): string {
  const moment = new Date(at);
  return `${dayAndShortMonth(moment)}, ${timeOfDay(moment)}, by ${by.replaceAll(' ', NO_BREAK)}`;
}

/** A name, and a count with its noun, stay on one line. */
const NO_BREAK = '\u00A0';

/** "6 pages, 24 trials, 41 tied numbers"; without pages before its PDF was printed. */
export function figureWords({
  pages,
  trials,
  tiedNumbers,
}: Pick<Edition, 'pages' | 'trials' | 'tiedNumbers'>): string {
  return [
    ...(pages === null ? [] : [countOf(pages, 'page')]),
    countOf(trials, 'trial'),
    countOf(tiedNumbers, 'tied number'),
  ]
    .map((figure) => figure.replaceAll(' ', NO_BREAK))
    .join(', ');
}
