/** How far each section of a report has come. A level is computed from the section, never set by hand. */
import type { Evidence, ValueReference } from '#shared/evidence/evidence.ts';
import { findValue } from '#shared/evidence/find-value.ts';
import type { Findings } from '#shared/evidence/findings.ts';
import { countWords, nodesOf } from './document-text.ts';
import type { ReportDocument, ReportNode, SectionNode } from './schema/report-node.ts';
import { findSection, type SectionName } from './schema/section-type.ts';
import { settingNames, untiedNumbers, type SettingNames } from './untied-numbers.ts';

/** Blank: nothing. Sketched: something. Drafted: enough, with its own piece. Tied: no loose number. Held: no claim in it leaks. */
export type SectionLevel = 'Blank' | 'Sketched' | 'Drafted' | 'Tied' | 'Held';

/** A section with its level and what it was made of. */
export interface LevelledSection {
  readonly section: SectionName;
  readonly level: SectionLevel;
  readonly words: number;
  /** Numbers typed by hand, and live values whose source is gone. */
  readonly notTied: number;
}

/** A section is not drafted below this many words. */
export const DRAFTED_FROM_WORDS = 80;

/**
 * The level of every section.
 *
 * @param document - the report
 * @param evidence - of the same problem
 * @param findings - of that evidence
 * @returns five sections in their order
 */
export function sectionLevels(
  document: ReportDocument,
  evidence: Evidence,
  findings: Findings,
): readonly LevelledSection[] {
  const settings = settingNames(evidence);
  return document.content.flatMap((section) => {
    const definition = findSection(section.type);
    if (!definition) return [];
    const words = countWords(section);
    const notTied = countLoose(section, evidence, findings, settings);
    return [
      {
        section: definition.name,
        level: levelOf(section, definition.name, words, notTied, findings),
        words,
        notTied,
      },
    ];
  });
}

function levelOf(
  section: SectionNode,
  name: SectionName,
  words: number,
  notTied: number,
  findings: Findings,
): SectionLevel {
  const nodes = [...nodesOf(section)];
  const hasParts = nodes.some(({ type }) => PARTS.has(type));
  if (words === 0 && !hasParts) return 'Blank';
  if (words < DRAFTED_FROM_WORDS || !OWN_PIECE[name](nodes)) return 'Sketched';
  if (notTied > 0) return 'Drafted';
  const holds = nodes.every(
    (node) => node.type !== 'claim' || findings.claims.get(node.attrs.claim)?.verdict === 'Holds',
  );
  return holds ? 'Held' : 'Tied';
}

const PARTS: ReadonlySet<string> = new Set([
  'liveValue',
  'inlineFormula',
  'formula',
  'chart',
  'trialsTable',
  'claim',
  'plate',
  'table',
]);

/** What a section cannot be without. An observation may be described in words, so the first needs no plate. */
const OWN_PIECE: Readonly<Record<SectionName, (nodes: readonly ReportNode[]) => boolean>> = {
  Phenomenon: () => true,
  Model: (nodes) => nodes.some(({ type }) => type === 'formula'),
  Experiment: (nodes) =>
    nodes.some(
      (node) => node.type === 'trialsTable' || (node.type === 'liveValue' && namesSeries(node.attrs.ref)),
    ),
  Comparison: (nodes) => nodes.some(({ type }) => type === 'chart'),
  Conclusion: (nodes) => nodes.some(({ type }) => type === 'claim'),
};

function namesSeries(ref: ValueReference): boolean {
  return 'series' in ref && ref.series !== undefined;
}

function countLoose(
  section: SectionNode,
  evidence: Evidence,
  findings: Findings,
  settings: SettingNames,
): number {
  let loose = 0;
  for (const node of nodesOf(section)) {
    if (node.type === 'text') loose += untiedNumbers(node.text, settings).length;
    if (node.type === 'liveValue' && findValue(findings, evidence, node.attrs.ref).shape === 'fault')
      loose += 1;
  }
  return loose;
}
