import { describe, expect, test } from 'vitest';
import { sectionAt, sectionText, toRange, toSpan } from '#shared/notes/section-text.ts';
import { emptyReport } from '#shared/report/schema/empty-report.ts';
import { reportSchema } from '#shared/report/schema/report-schema.ts';

function reportWith(...paragraphs: readonly (readonly object[])[]) {
  const empty = emptyReport();
  const content = empty.content.map((section) =>
    section.type === 'sectionModel'
      ? { ...section, content: paragraphs.map((content) => ({ type: 'paragraph', content })) }
      : section,
  );
  return reportSchema().nodeFromJSON({ ...empty, content });
}

const doc = reportWith(
  [
    { type: 'text', text: 'With ' },
    { type: 'inlineFormula', attrs: { latex: 'y' } },
    { type: 'text', text: ' it leans.' },
  ],
  [{ type: 'text', text: 'So it lands short.' }],
);

describe('sectionText', () => {
  test('of two paragraphs with a formula: reads the formula as one sign and parts the paragraphs', () => {
    expect(sectionText(doc, 'Model').text).toBe('With \uFFFC it leans.\nSo it lands short.');
    expect(sectionText(doc, 'Conclusion').text).toBe('');
  });

  test('when a span is turned into positions: the document has the same words there', () => {
    const read = sectionText(doc, 'Model');
    const from = read.text.indexOf('lands');
    const range = toRange(read, { from, to: from + 5 });

    expect(range && doc.textBetween(range.from, range.to)).toBe('lands');
    expect(range && toSpan(read, range)).toEqual({ from, to: from + 5 });
    expect(range && sectionAt(doc, range.from)).toBe('Model');
  });

  test('when nothing of a section lies in a range: gives no span', () => {
    const read = sectionText(doc, 'Model');

    expect(toSpan(read, { from: 0, to: 1 })).toBeNull();
    expect(toRange(read, { from: 3, to: 3 })).toBeNull();
    expect(toRange(read, { from: 0, to: 9_999 })).toBeNull();
  });
});
