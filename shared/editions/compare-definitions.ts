import type { Evidence } from '#shared/evidence/evidence.ts';
import { listInWords, startSentence } from '#shared/evidence/words.ts';
import { symbolToText } from '#shared/formatting/symbol.ts';
import { canonicalJson } from './canonical-json.ts';

type Table = 'instruments' | 'quantities' | 'series' | 'models' | 'comparisons' | 'claims' | 'charts';

const NAMES: { readonly [T in Table]: (row: Evidence[T][number]) => string } = {
  instruments: ({ name }) => `the instrument “${name}”`,
  quantities: ({ symbol, name }) => `${symbolToText(symbol)} (${name})`,
  series: ({ letter }) => `series ${letter}`,
  models: ({ n }) => `model ${n}`,
  comparisons: ({ name }) => `the comparison “${name}”`,
  claims: ({ n }) => `claim ${n}`,
  charts: ({ n }) => `chart ${n}`,
};

const TABLES = Object.keys(NAMES) as readonly Table[];

const compared = new WeakMap<Evidence, WeakMap<Evidence, readonly string[]>>();

/**
 * Definitions that were added, changed or removed, one sentence for each of the three, and one for the settings.
 *
 * @returns at most four sentences: "Model 3 and claim 4 added.", "y (height of the spout) changed."
 */
export function compareDefinitions(before: Evidence, after: Evidence): string[] {
  const known = compared.get(before)?.get(after);
  if (known) return [...known];
  const sentences = sentencesOf(before, after);
  const ofBefore = compared.get(before) ?? new WeakMap<Evidence, readonly string[]>();
  compared.set(before, ofBefore.set(after, sentences));
  return [...sentences];
}

function sentencesOf(before: Evidence, after: Evidence): string[] {
  const added: string[] = [];
  const changed: string[] = [];
  const removed: string[] = [];
  for (const table of TABLES) {
    const earlier = rowsOf(before, table);
    const later = rowsOf(after, table);
    for (const [id, { name, content }] of later) {
      const was = earlier.get(id);
      if (was === undefined) added.push(name);
      else if (was.content !== content) changed.push(name);
    }
    for (const [id, { name }] of earlier) if (!later.has(id)) removed.push(name);
  }
  const sentence = (names: readonly string[], what: string) =>
    names.length === 0 ? [] : [startSentence(`${listInWords(names)} ${what}.`)];
  const settings = canonicalJson(before.settings) === canonicalJson(after.settings);
  return [
    ...sentence(added, 'added'),
    ...sentence(changed, 'changed'),
    ...sentence(removed, 'removed'),
    ...(settings ? [] : ['The settings of the problem changed.']),
  ];
}

function rowsOf<T extends Table>(
  evidence: Evidence,
  table: T,
): Map<string, { readonly name: string; readonly content: string }> {
  const rows: readonly Evidence[T][number][] = evidence[table];
  return new Map(rows.map((row) => [row.id, { name: NAMES[table](row), content: canonicalJson(row) }]));
}
