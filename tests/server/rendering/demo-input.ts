/** The demonstration's report, ready to be printed. */
import { evaluate } from '#shared/evidence/evaluate.ts';
import type { Evidence } from '#shared/evidence/evidence.ts';
import type { BlockNode, ReportDocument } from '#shared/report/schema/report-node.ts';
import { leaningSpoutEvidence } from '#server/database/seeders/demo/leaning-spout-evidence.ts';
import { leaningSpoutReport } from '#server/database/seeders/demo/leaning-spout-report.ts';
import type { ReportPdfInput } from '#server/rendering/report-pdf.ts';

export const FIRST_START = new Date('2026-03-03T12:00:00.000Z');

export const DEMO_EVIDENCE: Evidence = leaningSpoutEvidence(FIRST_START);

export function demoInput(changes: Partial<ReportPdfInput> = {}): ReportPdfInput {
  const evidence = changes.evidence ?? DEMO_EVIDENCE;
  const person = (id: string, name: string, role: 'captain' | 'member' | 'advisor') => ({ id, name, role });
  return {
    problem: {
      number: 1,
      title: 'Leaning Spout',
      statement: 'A tall can with a hole in its side is filled and leaned. How far can its jet reach?',
      owners: [person('1', 'Ines Farrow', 'captain'), person('2', 'Kasimir Lund', 'member')],
    },
    team: {
      name: 'Tern Rock',
      university: 'Skerry University',
      people: [person('5', 'Odile Marsk', 'advisor')],
      isDemo: true,
    },
    document: leaningSpoutReport(DEMO_EVIDENCE),
    evidence,
    findings: evaluate(evidence),
    plates: new Map(),
    edition: null,
    at: '2026-03-03T14:32:00.000Z',
    ...changes,
  };
}

/** A report with these blocks in its third section and nothing else. */
export function documentOf(...blocks: readonly BlockNode[]): ReportDocument {
  return {
    type: 'doc',
    content: [
      { type: 'sectionPhenomenon' },
      { type: 'sectionModel' },
      { type: 'sectionExperiment', content: blocks },
      { type: 'sectionComparison' },
      { type: 'sectionConclusion' },
    ],
  };
}

export const paragraphOf = (text: string): BlockNode => ({
  type: 'paragraph',
  content: [{ type: 'text', text }],
});
