import { describe, expect, test } from 'vitest';
import { reportSchema } from '#shared/report/schema/report-schema.ts';
import { foldedSections } from '#src/features/report/editor/folded-sections.ts';
import { sectionContents } from '#src/features/report/views/section-contents.ts';
import { leaningSpoutEvidence } from '#server/database/seeders/demo/leaning-spout-evidence.ts';
import { leaningSpoutReport } from '#server/database/seeders/demo/leaning-spout-report.ts';

const evidence = leaningSpoutEvidence(new Date('2026-03-03T12:00:00Z'));
const document = reportSchema().nodeFromJSON(leaningSpoutReport(evidence));

describe('a folded section', () => {
  test('says what it holds, by kind, each in its number', () => {
    expect(sectionContents(document.child(2))).toBe('3 paragraphs and 1 table');
    expect(sectionContents(document.child(3))).toContain('1 chart');
  });

  test('with one empty paragraph: holds nothing yet', () => {
    const empty = reportSchema().nodeFromJSON({ type: 'sectionModel', content: [{ type: 'paragraph' }] });

    expect(sectionContents(empty)).toBe('nothing yet');
  });

  test('is still folded when the report is opened again in this browser, and no other report is', () => {
    foldedSections('tern-rock/1').setFolded('Experiment', true);

    expect([...foldedSections('tern-rock/1').get()]).toEqual(['Experiment']);
    expect([...foldedSections('tern-rock/4').get()]).toEqual([]);

    foldedSections('tern-rock/1').setFolded('Experiment', false);
    expect([...foldedSections('tern-rock/1').get()]).toEqual([]);
  });
});
