import { describe, expect, test } from 'vitest';
import { leaningSpoutEvidence } from '#server/database/seeders/demo/leaning-spout-evidence.ts';
import { leaningSpoutReport } from '#server/database/seeders/demo/leaning-spout-report.ts';
import { compareEditions, type ComparedSide } from '#shared/editions/compare-editions.ts';
import type { TextPiece } from '#shared/editions/edition-comparison.ts';
import { worthDoing } from '#shared/editions/worth-doing.ts';
import { evaluate } from '#shared/evidence/evaluate.ts';
import type { Evidence } from '#shared/evidence/evidence.ts';
import type { BlockNode, InlineNode, ReportDocument } from '#shared/report/schema/report-node.ts';

const EVIDENCE = leaningSpoutEvidence(new Date('2026-03-03T12:00:00.000Z'));
const DOCUMENT = leaningSpoutReport(EVIDENCE);

const sideOf = (evidence: Evidence, document: ReportDocument = DOCUMENT): ComparedSide => ({
  evidence,
  document,
  findings: evaluate(evidence),
});
const NOW = sideOf(EVIDENCE);

function without(...trials: readonly string[]): Evidence {
  return { ...EVIDENCE, trials: EVIDENCE.trials.filter(({ id }) => !trials.includes(id)) };
}

function withModel(blocks: readonly BlockNode[]): ReportDocument {
  return {
    ...DOCUMENT,
    content: DOCUMENT.content.map((section) =>
      section.type === 'sectionModel' ? { ...section, content: blocks } : section,
    ),
  };
}

const text = (words: string): InlineNode => ({ type: 'text', text: words });
const paragraph = (...content: readonly InlineNode[]): BlockNode => ({ type: 'paragraph', content });
const reads = (pieces: readonly TextPiece[], change: TextPiece['change']) =>
  pieces
    .filter((piece) => piece.change === change)
    .map((piece) => piece.text.trim())
    .join(' … ');

describe('what moved, in numbers', () => {
  test('two equal sides, when compared: nothing moved', () => {
    expect(compareEditions(NOW, sideOf(structuredClone(EVIDENCE), structuredClone(DOCUMENT)))).toEqual({
      values: [],
      newlyTied: 0,
      noLongerTied: 0,
      verdicts: [],
      trials: [],
      definitions: [],
      passages: [],
    });
  });

  test('a trial, when it was logged since: is named, with the means that follow it and why', () => {
    const { values, trials, passages } = compareEditions(sideOf(without('trial-b13')), NOW);

    expect(trials).toEqual(['1 trial logged: B13.']);
    const mean = values.find(({ name }) => name === 'range on the tray at 38°' || name.endsWith('at 38°'));
    expect(mean).toMatchObject({ hue: 'measured', why: 'B13 added', section: 4 });
    expect(mean?.before).not.toBe(mean?.after);
    expect(passages).toEqual([]);
  });

  test('a claim, when its third trial came: is told with both verdicts', () => {
    const { verdicts } = compareEditions(sideOf(without('trial-b13')), NOW);

    expect(verdicts).toContainEqual(
      expect.objectContaining({ n: 3, before: 'Undecided', after: 'Leaks' }) as unknown,
    );
  });

  test('a trial, when it was excluded, brought back or corrected: is said with its reason', () => {
    const before: Evidence = {
      ...EVIDENCE,
      trials: EVIDENCE.trials.map((trial) => {
        const { excluded: _excluded, ...kept } = trial;
        if (trial.id === 'trial-b11') return kept;
        if (trial.id === 'trial-b1')
          return { ...trial, excluded: { reason: 'wet tray', by: 'I', at: trial.at } };
        if (trial.id === 'trial-b2')
          return { ...trial, values: { ...trial.values, 'q-r': { text: '36.5', unit: 'cm' } } };
        return trial;
      }),
    };

    const { trials, values } = compareEditions(sideOf(before), NOW);

    expect(trials).toEqual([
      'B11 excluded: Can slid back 3 cm; range read from the old mark.',
      'B1 brought back.',
      'B2 corrected.',
    ]);
    expect(values.find(({ why }) => why === 'B11 left out')).toBeDefined();
  });

  test('definitions, when added, changed and removed: are named', () => {
    const [first, ...claims] = EVIDENCE.claims;
    const before: Evidence = {
      ...EVIDENCE,
      claims,
      quantities: EVIDENCE.quantities.map((row) => (row.id === 'q-r' ? { ...row, name: 'reach' } : row)),
      charts: [...EVIDENCE.charts, { id: 'chart-9', n: 9, comparison: 'x', x: 'q-r', sentence: '' }],
      settings: { ...EVIDENCE.settings, k: 3 },
    };

    const { definitions } = compareEditions({ ...NOW, evidence: before }, NOW);

    expect(definitions).toEqual([
      `Claim ${first?.n ?? 0} added.`,
      expect.stringMatching(/^R \(.+\) changed\.$/) as unknown,
      'Chart 9 removed.',
      'The settings of the problem changed.',
    ]);
  });
});

describe('what moved, in words', () => {
  const old = withModel([
    paragraph(text('The jet leaves level and lands close to the can.')),
    paragraph(text('We leave drag out.')),
  ]);

  test('a paragraph, when words in it changed: is told word by word', () => {
    const { passages } = compareEditions(
      sideOf(EVIDENCE, old),
      sideOf(
        EVIDENCE,
        withModel([
          paragraph(text('The jet leaves upwards and lands close to the can.')),
          paragraph(text('We leave drag out.')),
        ]),
      ),
    );

    expect(passages).toHaveLength(1);
    expect(passages[0]).toMatchObject({ section: 2, change: 'changed' });
    expect(reads(passages[0]?.pieces ?? [], 'removed')).toBe('level');
    expect(reads(passages[0]?.pieces ?? [], 'added')).toBe('upwards');
  });

  test('paragraphs, when one came and one went: are told whole', () => {
    const { passages } = compareEditions(
      sideOf(EVIDENCE, old),
      sideOf(
        EVIDENCE,
        withModel([
          paragraph(text('The jet leaves level and lands close to the can.')),
          paragraph(text('Surface tension holds short jets together below four centimetres.')),
        ]),
      ),
    );

    expect(
      passages.map(({ change, pieces }) => `${change}: ${pieces.map((piece) => piece.text).join('')}`),
    ).toEqual([
      'removed: We leave drag out.',
      'added: Surface tension holds short jets together below four centimetres.',
    ]);
  });

  test('a tied number, when it reads otherwise: does not count as other words', () => {
    const { passages, values } = compareEditions(sideOf(without('trial-b13')), NOW);

    expect(values.length).toBeGreaterThan(0);
    expect(passages).toEqual([]);
  });

  test('a typed number, when it was tied: is told, and counted', () => {
    const live: InlineNode = {
      type: 'liveValue',
      attrs: { ref: { kind: 'quantity', quantity: 'q-g' }, form: 'value', unit: null, shown: null },
    };
    const { passages, newlyTied } = compareEditions(
      sideOf(EVIDENCE, withModel([paragraph(text('It falls with 9.81 m/s² all the way.'))])),
      sideOf(EVIDENCE, withModel([paragraph(text('It falls with '), live, text(' all the way.'))])),
    );

    expect(newlyTied).toBe(1);
    expect(passages[0]?.change).toBe('changed');
    expect(passages[0]?.pieces.filter(({ kind }) => kind === 'value')).toHaveLength(1);
  });

  test('a caption, when changed: is told with the name of its chart', () => {
    const changed: ReportDocument = JSON.parse(
      JSON.stringify(DOCUMENT).replace('Range against lean at one head.', 'Range against lean, head held.'),
    ) as ReportDocument;

    const { passages } = compareEditions(NOW, sideOf(EVIDENCE, changed));

    expect(passages).toHaveLength(1);
    expect(passages[0]?.pieces[0]).toEqual({ change: 'same', kind: 'part', text: 'Chart 1' });
  });
});

describe('what is worth doing', () => {
  test('the draft of the demonstration, when looked through: has its loose numbers and its open claims', () => {
    expect(worthDoing(DOCUMENT, EVIDENCE, NOW.findings)).toEqual({
      notTied: [{ section: 4, count: 2 }],
      blank: [],
      leaking: [3],
      undecided: [4],
    });
  });
});
