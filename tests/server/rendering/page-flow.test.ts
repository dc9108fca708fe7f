import { describe, expect, test } from 'vitest';
import { documentOf, demoInput, paragraphOf } from './demo-input.ts';
import { readPdf } from './read-pdf.ts';
import type { BlockNode } from '#shared/report/schema/report-node.ts';
import { renderReportPdf } from '#server/rendering/report-pdf.ts';

const HEADING: BlockNode = {
  type: 'heading',
  attrs: { level: 2 },
  content: [{ type: 'text', text: 'What was left' }],
};
const SENTENCE =
  'The can stands on a wedge that is clamped to the bench, and the range is read on a tray that is kept level. ';

async function pagesOf(...blocks: readonly BlockNode[]): Promise<readonly string[]> {
  const { bytes } = await renderReportPdf(demoInput({ document: documentOf(...blocks) }));
  return (await readPdf(bytes)).pages;
}

const lines = (count: number) => Array.from({ length: count }, (_, i) => paragraphOf(`Line ${i + 1}.`));

describe('pages', () => {
  test.each([18, 19, 20, 21, 22, 23, 24, 25])(
    'heading after %i lines, when the page ends near it: stands with two lines of what follows',
    async (count) => {
      const pages = await pagesOf(...lines(count), HEADING, paragraphOf(`Begin. ${SENTENCE.repeat(4)}`));

      const page = pages.find((text) => text.includes('What was left')) ?? '';

      expect(page).toContain('Begin. The can stands on a wedge');
      expect(page.match(/range is read/gu)?.length ?? 0).toBeGreaterThanOrEqual(1);
    },
  );

  test.each([19, 20, 21, 22, 23])(
    'paragraph of four lines after %i others, when it crosses a page: leaves two lines on each side',
    async (count) => {
      const pages = await pagesOf(...lines(count), paragraphOf(`Open ${SENTENCE.repeat(3)}close`));

      const first = pages.findIndex((text) => text.includes('Open The can'));
      const last = pages.findIndex((text) => /close/u.test(text));
      const tail = (pages[last] ?? '').replace(/Leaning Spout.*?University|Draft.*/gu, '');

      if (last > first) expect(tail.length).toBeGreaterThan(100);
      expect(last - first).toBeLessThanOrEqual(1);
    },
  );

  test.each([12, 14, 16, 18, 20])(
    'a chart after %i lines, when it does not fit: moves to the next page whole, with its caption',
    async (count) => {
      const chart: BlockNode = {
        type: 'chart',
        attrs: { anchor: 'abcd', chart: demoInput().evidence.charts[0]?.id ?? '', caption: 'The last word.' },
      };

      const pages = await pagesOf(...lines(count), chart);

      const withCaption = pages.filter((text) => text.includes('The last word.'));
      const withAxis = pages.filter((text) => text.includes('(measured − predicted)'));
      expect(withCaption).toEqual(withAxis);
    },
  );

  test('an empty report, when printed: is its title block alone', async () => {
    const pages = await pagesOf();

    expect(pages).toHaveLength(1);
    expect(pages[0]).not.toContain('Experiment');
  });
});
