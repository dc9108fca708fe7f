/** What a reader sees of the invented report: levels, loose numbers, values, provenance, formulas. */
import { describe, expect, test } from 'vitest';
import { evaluate } from '#shared/evidence/evaluate.ts';
import { optionsForSymbol } from '#shared/report/value-options.ts';
import { showValue } from '#shared/report/live-value.ts';
import { sectionLevels } from '#shared/report/levels.ts';
import { provenanceOf } from '#shared/report/provenance.ts';
import { equationSteps } from '#shared/report/formula-steps.ts';
import { trialsTable } from '#shared/report/trials-table.ts';
import { parseReportDocument } from '#shared/report/schema/parse-report-document.ts';
import { emptyReport } from '#shared/report/schema/empty-report.ts';
import { settingNames, untiedNumbers } from '#shared/report/untied-numbers.ts';
import { leaningSpoutEvidence } from '#server/database/seeders/demo/leaning-spout-evidence.ts';
import { leaningSpoutReport } from '#server/database/seeders/demo/leaning-spout-report.ts';

const evidence = leaningSpoutEvidence(new Date('2026-03-03T12:00:00Z'));
const findings = evaluate(evidence);
const document = leaningSpoutReport(evidence);
const plain = (text: string) => text.replaceAll('\u00a0', ' ');
const idOf = (symbol: string) => evidence.quantities.find((row) => row.symbol === symbol)?.id ?? '';
const series = evidence.series.find(({ letter }) => letter === 'B');
const trial = evidence.trials.find((row) => row.series === series?.id && row.number === 10);
const at38 = Object.fromEntries(
  (series?.settings ?? []).flatMap((id) => (trial?.values[id] ? [[id, trial.values[id]]] : [])),
);
const mean38 = { kind: 'mean', quantity: idOf('R'), series: series?.id ?? '', at: at38 } as const;

describe('levels', () => {
  test('of the demonstration: the comparison waits for two numbers to be tied', () => {
    const levels = sectionLevels(document, evidence, findings);

    expect(levels.map(({ section, level }) => `${section}: ${level}`)).toEqual([
      'Phenomenon: Held',
      'Model: Held',
      'Experiment: Held',
      'Comparison: Drafted',
      'Conclusion: Tied',
    ]);
    expect(levels.reduce((sum, { notTied }) => sum + notTied, 0)).toBe(2);
  });

  test('of an empty report: all blank', () => {
    expect(new Set(sectionLevels(emptyReport(), evidence, findings).map(({ level }) => level))).toEqual(
      new Set(['Blank']),
    );
  });
});

describe('untied numbers', () => {
  const settings = settingNames(evidence);

  test.each([
    ['The drops are 3 mm wide.', ['3 mm']],
    ['It gives 0.967 ± 0.008 in all.', ['0.967 ± 0.008']],
    ['At 38° and a head of 20 cm, in 12 trials of 2026.', []],
    ['See Figure 4, model 3 and section 2.1; within 2 u.', []],
    ['It takes 2.5 s or 2,5 s.', ['2.5 s', '2,5 s']],
  ])('%s', (text, found) => {
    expect(untiedNumbers(text, settings).map((number) => number.text)).toEqual(found);
  });
});

describe('a live value', () => {
  test('the mean at 38°: value, words for a listener, hue', () => {
    const shown = showValue(mean38, 'value', null, evidence, findings);

    expect(plain(shown.text)).toBe('46.4 ± 0.3 cm');
    expect(shown.spoken).toMatch(/46\.4 plus or minus 0\.3 centimetres, measured, 3 trials/);
    expect(shown.hue).toBe('measured');
  });

  test('its provenance: three trials, two parts, and the trial that was left out with its reason', () => {
    const card = provenanceOf(mean38, evidence, findings);
    const words = JSON.stringify(card.terms);

    for (const name of ['B10', 'B12', 'B13']) expect(words).toContain(name);
    expect(words).not.toMatch(/gone|not named/);
    expect(card.leftOut).toMatch(/B11.*43\.5/);
    expect(card.plot?.excluded).toHaveLength(1);
  });

  test('what R may mean in a sentence about 45°: the mean at 45° comes first', () => {
    const [first] = optionsForSymbol('R', evidence, findings, 'At 45° we find ');

    expect(first?.words).toMatch(/^mean at 45°/);
  });

  test('whose quantity is gone: says so instead of a number', () => {
    const shown = showValue({ kind: 'quantity', quantity: 'nothing' }, 'value', null, evidence, findings);

    expect(shown.state).toBe('fault');
    expect(shown.fault?.code).toBe('source gone');
  });
});

describe('formulas and tables', () => {
  test('the largest range in steps: numbers carry their kind, the result its uncertainty', () => {
    const model = evidence.models.find(({ n }) => n === 3)?.id ?? '';
    const steps = equationSteps(
      { model, defines: idOf('R_max'), series: series?.id ?? null, at: {} },
      'numbers and result',
      evidence,
      findings,
    );

    expect(steps.ok && steps.numbers).toMatch(/\\htmlClass\{fp\}\{18\.7/);
    expect(steps.ok && steps.numbers).toMatch(/\\htmlClass\{fm\}\{12\.0/);
    expect(steps.ok && steps.numbers).toContain('47.9');
  });

  test('the table of series B: groups in the order of the lean, the excluded trial with its reason', () => {
    const table = trialsTable(series?.id ?? '', evidence, findings);
    const rows = table?.groups.flatMap((group) => group.rows) ?? [];

    expect(table?.groups).toHaveLength(6);
    expect(rows.find(({ name }) => name === 'B11')?.excluded).toContain('slid back');
    expect(rows).toHaveLength(19);
  });
});

describe('the document', () => {
  test('of the demonstration: passes its own schema, and comes back the same', () => {
    const parsed = parseReportDocument(document);

    expect(parsed.ok && JSON.parse(JSON.stringify(parsed.document))).toEqual(
      JSON.parse(JSON.stringify(document)),
    );
  });

  test.each([
    ['an unknown node', { type: 'video' }],
    [
      'a live value without a reference',
      {
        type: 'paragraph',
        content: [{ type: 'liveValue', attrs: { ref: null, form: 'value', unit: null, shown: null } }],
      },
    ],
    [
      'a link that runs a program',
      {
        type: 'paragraph',
        content: [
          { type: 'text', text: 'x', marks: [{ type: 'link', attrs: { href: 'javascript:alert(1)' } }] },
        ],
      },
    ],
    ['a heading of a level that is not there', { type: 'heading', attrs: { level: 1 } }],
  ])('with %s: is refused', (_what, block) => {
    const [first, ...rest] = emptyReport().content;

    expect(parseReportDocument({ type: 'doc', content: [{ ...first, content: [block] }, ...rest] }).ok).toBe(
      false,
    );
  });
});
