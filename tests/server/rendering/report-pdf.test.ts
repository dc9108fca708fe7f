import { execFile } from 'node:child_process';
import { createHash } from 'node:crypto';
import { fileURLToPath } from 'node:url';
import { promisify } from 'node:util';
import sharp from 'sharp';
import { beforeAll, describe, expect, test } from 'vitest';
import { evaluate } from '#shared/evidence/evaluate.ts';
import type { Evidence } from '#shared/evidence/evidence.ts';
import { showValue } from '#shared/report/live-value.ts';
import type { BlockNode, LiveValueNode, ReportNode } from '#shared/report/schema/report-node.ts';
import { renderReportPdf, type ReportPdf, type ReportPdfInput } from '#server/rendering/report-pdf.ts';
import { DEMO_EVIDENCE, demoInput, documentOf, paragraphOf } from './demo-input.ts';
import { contentLines, elementsOf, paintedLines, readPdf, type ReadPdf } from './read-pdf.ts';

const plainSpaces = (text: string) => text.replaceAll(/\s+/gu, ' ');

async function print(changes: Partial<ReportPdfInput> = {}): Promise<ReadPdf> {
  return readPdf((await renderReportPdf(demoInput(changes))).bytes);
}

const printBlocks = (...blocks: readonly BlockNode[]) => print({ document: documentOf(...blocks) });

function liveValues(node: ReportNode): LiveValueNode[] {
  if (node.type === 'liveValue') return [node];
  return 'content' in node ? (node.content ?? []).flatMap((child) => liveValues(child)) : [];
}

/** Whether the words stand in the text one after the other. */
function inOrder(text: string, words: readonly string[]): string | null {
  let from = 0;
  for (const word of words) {
    const at = text.indexOf(word, from);
    if (at < 0) return word;
    from = at + word.length;
  }
  return null;
}

describe('the demonstration’s report as PDF', () => {
  let file: ReportPdf;
  let read: ReadPdf;
  beforeAll(async () => {
    file = await renderReportPdf(demoInput());
    read = await readPdf(file.bytes);
  });

  test('printed, when read by a program: has every tied number in the order of the text', () => {
    const { document, evidence, findings } = demoInput();
    const shown = liveValues(document).map(({ attrs }) =>
      plainSpaces(showValue(attrs.ref, attrs.form, attrs.unit, evidence, findings).value),
    );

    expect(shown.length).toBeGreaterThan(10);
    expect(inOrder(read.text, shown)).toBeNull();
  });

  test('printed, when read: begins with number, name, task, people and team', () => {
    const parts = [
      'Problem 1',
      'Leaning Spout',
      'A tall can',
      'Ines Farrow, Kasimir Lund',
      'Odile Marsk',
      'Tern Rock',
    ];

    expect(inOrder(read.pages[0] ?? '', parts)).toBeNull();
    expect(read.pages[0]).toContain('People and data are invented');
  });

  test('printed, when read: has head, foot with the day and the page’s number', () => {
    read.pages.forEach((page, i) => {
      expect(page).toMatch(new RegExp(`Draft, 3 March 2026 ?${i + 1}`, 'u'));
      expect(page).toContain('Tern Rock, Skerry University');
    });
  });

  test('printed, when read: names each number’s letter and source at the end', () => {
    const list = read.text.slice(read.text.indexOf('Where the numbers come from'));

    expect(list).toContain('B10, B12, B13; B11 excluded');
    expect(list).toContain('series A, 10 of 12 trials');
  });

  test('printed, when read: shows claims with their verdicts and the excluded trial with its reason', () => {
    expect(read.text).toMatch(/Claim 3\. .*? Leaks/u);
    expect(read.text).toMatch(/B11 ⊗ .*?Can slid back/u);
  });

  test('bookmarks, when opened: are the sections, their headings and the list', () => {
    expect(read.outline).toEqual([
      '1 Phenomenon',
      '2 Model',
      '3 Experiment',
      '4 Comparison',
      'Could a wrong coefficient be the reason?',
      '5 Conclusion',
      'Where the numbers come from',
    ]);
  });

  test('structure, when walked: has headings, figures and formulas with words for who cannot see them', () => {
    const count = (role: string) => elementsOf(read.structure, role).length;

    expect(count('H1')).toBe(1);
    expect(elementsOf(read.structure, 'Figure').every(({ alt }) => (alt ?? '').length > 20)).toBe(true);
    expect(elementsOf(read.structure, 'Formula').every(({ alt }) => (alt ?? '') !== '')).toBe(true);
    expect(count('TH')).toBeGreaterThan(5);
    expect(count('TD')).toBeGreaterThan(50);
    expect(count('LI')).toBe(3);
    expect(read.lang).toBe('en-GB');
    expect(read.title).toBe('Problem 1: Leaning Spout');
  });

  test('every operator that paints, when the pages are walked: stands inside marked content', () => {
    const { painted, untagged } = paintedLines(file.bytes);

    expect(painted).toBeGreaterThan(300);
    expect(untagged).toEqual([]);
  });

  test('numbers that are typed, when printed: keep their dashed box', () => {
    const dashed = contentLines(file.bytes).filter((line) => line.includes('[2 1.6] 0 d'));

    expect(dashed).toHaveLength(2);
  });

  test('printed again, when nothing has changed: is the same file', async () => {
    const again = await renderReportPdf(demoInput());

    expect(Buffer.from(again.bytes).equals(Buffer.from(file.bytes))).toBe(true);
  });

  test.each([
    ['UTC', 'C'],
    ['Pacific/Auckland', 'de_DE.UTF-8'],
  ])(
    'printed in time zone %s and locale %s, when compared: is the same file',
    async (TZ, LANG) => {
      const script = fileURLToPath(new URL('./print-demo.ts', import.meta.url));
      const env = { ...process.env, TZ, LANG, LC_ALL: LANG };

      const { stdout } = await promisify(execFile)(process.execPath, ['--import', 'tsx', script], { env });

      expect(stdout).toBe(createHash('sha256').update(file.bytes).digest('hex'));
    },
    60_000,
  );

  test('progress, when printed: rises and says what is being done', async () => {
    const told: [number, string][] = [];

    await renderReportPdf(demoInput(), (share, at) => told.push([share, at]));

    expect(told.map(([share]) => share)).toEqual(told.map(([share]) => share).toSorted((a, b) => a - b));
    expect(told.map(([, at]) => at)).toContain('Setting section 2 of 5');
  });
});

describe('a trial that is excluded', () => {
  test('printed, when B13 is left out: the mean follows and its list says so', async () => {
    const trials = DEMO_EVIDENCE.trials.map((trial) =>
      trial.series === DEMO_EVIDENCE.series.find(({ letter }) => letter === 'B')?.id && trial.number === 13
        ? { ...trial, excluded: { reason: 'The tray was knocked', by: 'Ines Farrow', at: trial.at } }
        : trial,
    );
    const evidence: Evidence = { ...DEMO_EVIDENCE, trials };

    const { text } = await print({ evidence, findings: evaluate(evidence) });

    expect(text).toContain('46.2 ±');
    expect(text).toContain('B10, B12; B11, B13 excluded');
    expect(text).toContain('The tray was knocked');
  });
});

describe('paper', () => {
  test.each([
    ['A4', [595.28, 841.89]],
    ['Letter', [612, 792]],
  ] as const)(
    '%s, when the problem asks for it: is the size of every page',
    async (paper, [width, height]) => {
      const evidence: Evidence = { ...DEMO_EVIDENCE, settings: { ...DEMO_EVIDENCE.settings, paper } };

      const { size } = await print({ evidence });

      expect(size[0]).toBeCloseTo(width, 1);
      expect(size[1]).toBeCloseTo(height, 1);
    },
  );
});

describe('parts that cannot be shown', () => {
  test('a number whose source is gone, when printed: keeps its last words and has no letter', async () => {
    const ref = { kind: 'quantity', quantity: 'gone' } as const;
    const { text } = await printBlocks({
      type: 'paragraph',
      content: [{ type: 'liveValue', attrs: { ref, form: 'value', unit: null, shown: '7.25 ± 0.05 cm' } }],
    });

    expect(text).toContain('7.25 ± 0.05 cm');
    expect(text).not.toContain('Where the numbers come from');
  });

  test('a chart that is gone, when printed: says so in its place', async () => {
    const { text } = await printBlocks({
      type: 'chart',
      attrs: { anchor: 'abcd', chart: 'gone', caption: '' },
    });

    expect(text).toContain('Figure 1 cannot be drawn.');
  });

  test('a formula that cannot be read, when printed: stands as it was typed', async () => {
    const { text } = await printBlocks({
      type: 'paragraph',
      content: [{ type: 'inlineFormula', attrs: { latex: '\\frac{a' } }],
    });

    expect(text).toContain('\\frac{a');
  });

  test('a claim and a series that are gone, when printed: say so', async () => {
    const { text } = await printBlocks(
      { type: 'claim', attrs: { anchor: 'abcd', claim: 'gone' } },
      { type: 'trialsTable', attrs: { anchor: 'abce', series: 'gone', caption: '' } },
    );

    expect(text).toContain('A claim stood here');
    expect(text).toContain('Table 1 cannot be shown');
  });

  test('a picture whose file is missing, when printed: says so', async () => {
    const { text } = await printBlocks(plateBlock('a'.repeat(64)));

    expect(text).toContain('Plate 1 cannot be shown');
  });
});

function plateBlock(sha: string): BlockNode {
  const attrs = {
    anchor: 'abcd',
    sha,
    width: 40,
    height: 20,
    caption: 'The can on its wedge.',
    alt: 'A tall can',
  };
  return { type: 'plate', attrs };
}

describe('plates, lists and tables', () => {
  test('a picture, when printed: is a figure with its words and its caption', async () => {
    const sha = 'b'.repeat(64);
    const bytes = await sharp({ create: { width: 40, height: 20, channels: 3, background: '#888888' } })
      .jpeg()
      .toBuffer();

    const read = await print({ document: documentOf(plateBlock(sha)), plates: new Map([[sha, bytes]]) });

    expect(read.text).toContain('Plate 1. The can on its wedge.');
    expect(elementsOf(read.structure, 'Figure')).toMatchObject([{ alt: 'A tall can' }]);
  });

  test('a numbered list, when it begins at iv: goes on in Roman figures', async () => {
    const item = (text: string) => ({ type: 'listItem', content: [paragraphOf(text)] }) as const;
    const { text } = await printBlocks({
      type: 'orderedList',
      attrs: { start: 4, type: 'i' },
      content: [item('clamp the wedge'), item('fill the can')],
    });

    expect(inOrder(text, ['iv.', 'clamp the wedge', 'v.', 'fill the can'])).toBeNull();
  });

  test('a table longer than a page, when printed: has its head on every page, once in the structure', async () => {
    const cell = (type: 'tableHeader' | 'tableCell', text: string) =>
      ({
        type,
        attrs: { colspan: 1, rowspan: 1, colwidth: null, align: null },
        content: [{ type: 'text', text }],
      }) as const;
    const rows = Array.from({ length: 60 }, (_, i) => ({
      type: 'tableRow' as const,
      content: [cell('tableCell', `part ${i + 1}`), cell('tableCell', 'steel')],
    }));
    const read = await printBlocks({
      type: 'table',
      content: [
        { type: 'tableRow', content: [cell('tableHeader', 'Part'), cell('tableHeader', 'Made of')] },
        ...rows,
      ],
    });

    expect(read.pages.length).toBeGreaterThan(1);
    expect(read.pages.every((page) => page.includes('Made of'))).toBe(true);
    // pdf.js gives each page the whole table that it has a part of.
    expect(elementsOf(read.structure.slice(0, 1), 'TH')).toHaveLength(2);
    expect(inOrder(read.text, ['part 1', 'part 30', 'part 60'])).toBeNull();
  });
});
