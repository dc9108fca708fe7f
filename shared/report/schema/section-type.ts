/** The five sections of every report, in their order. */

/** Node type of a section. */
export type SectionType =
  'sectionPhenomenon' | 'sectionModel' | 'sectionExperiment' | 'sectionComparison' | 'sectionConclusion';

/** Name of a section as people read it. */
export type SectionName = 'Phenomenon' | 'Model' | 'Experiment' | 'Comparison' | 'Conclusion';

/** One section: its node type, its number and its name. */
export interface SectionDefinition {
  readonly type: SectionType;
  readonly number: number;
  readonly name: SectionName;
}

/**
 * The sections in their order. Each is a node type of its own, so that the document's content is a fixed sequence
 * and no edit can lose or double one.
 *
 * @example REPORT_SECTIONS[3].name // => 'Comparison'
 */
export const REPORT_SECTIONS = [
  { type: 'sectionPhenomenon', number: 1, name: 'Phenomenon' },
  { type: 'sectionModel', number: 2, name: 'Model' },
  { type: 'sectionExperiment', number: 3, name: 'Experiment' },
  { type: 'sectionComparison', number: 4, name: 'Comparison' },
  { type: 'sectionConclusion', number: 5, name: 'Conclusion' },
] as const satisfies readonly SectionDefinition[];

/**
 * The section that a node type stands for, or null for any other node.
 *
 * @example findSection('sectionModel').number // => 2
 * @example findSection('paragraph') // => null
 */
export function findSection(type: string): SectionDefinition | null {
  return REPORT_SECTIONS.find((section) => section.type === type) ?? null;
}
