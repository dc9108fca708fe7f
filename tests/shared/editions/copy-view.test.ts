/** What of an edition a reader gets: the report reads the same, and nothing that it does not reach comes with it. */
import { describe, expect, test } from 'vitest';
import { buildCopyView } from '#shared/editions/build-copy-view.ts';
import { evidenceOfCopy, findingsOfCopy } from '#shared/editions/read-copy-view.ts';
import { copyViewSchema } from '#shared/editions/copy-view.ts';
import type { FrozenEdition } from '#shared/editions/frozen-edition.ts';
import { evaluate } from '#shared/evidence/evaluate.ts';
import type { Evidence, ValueReference } from '#shared/evidence/evidence.ts';
import { findingsToJson } from '#shared/evidence/findings-json.ts';
import { keyOf } from '#shared/evidence/keys.ts';
import { claimLine } from '#shared/report/claim-line.ts';
import { nodesOf } from '#shared/report/document-text.ts';
import { equationSteps } from '#shared/report/formula-steps.ts';
import { showValue } from '#shared/report/live-value.ts';
import { provenanceOf, type ProvenanceTerm } from '#shared/report/provenance.ts';
import { trialsTable } from '#shared/report/trials-table.ts';
import type { ReportDocument } from '#shared/report/schema/report-node.ts';
import { brakedMagnetEvidence } from '#server/database/seeders/demo/braked-magnet-evidence.ts';
import { brakedMagnetReport } from '#server/database/seeders/demo/braked-magnet-report.ts';
import { fallingCupsEvidence } from '#server/database/seeders/demo/falling-cups-evidence.ts';
import { fallingCupsReport } from '#server/database/seeders/demo/falling-cups-report.ts';
import { leaningSpoutEvidence } from '#server/database/seeders/demo/leaning-spout-evidence.ts';
import { leaningSpoutReport } from '#server/database/seeders/demo/leaning-spout-report.ts';

const FIRST_START = new Date('2026-03-03T12:00:00.000Z');
const SEALED = { n: 2, seal: 'b7e241c09d3a' };

function frozen(evidence: Evidence, document: ReportDocument): FrozenEdition {
  return {
    schemaVersion: 1,
    reportSchema: 1,
    problem: {
      number: 1,
      title: 'Leaning Spout',
      statement: 'How far can its jet reach?',
      tasks: [],
      owners: [{ name: 'Ines Farrow', role: 'captain' }],
    },
    team: { name: 'Tern Rock', university: 'Skerry University', isDemo: true, people: [] },
    evidence,
    document,
    findings: JSON.parse(JSON.stringify(findingsToJson(evaluate(evidence)))),
    files: [],
    at: '2026-02-28T18:00:00.000Z',
  };
}

const spout = leaningSpoutEvidence(FIRST_START);
const cups = fallingCupsEvidence(FIRST_START);
const magnet = brakedMagnetEvidence(FIRST_START);
const REPORTS = [
  ['Leaning Spout', spout, leaningSpoutReport(spout)],
  ['Falling Cups', cups, fallingCupsReport(cups)],
  ['Braked Magnet', magnet, brakedMagnetReport(magnet)],
] as const;

/** References of a report: its live values, and the points of its charts. */
function referencesOf(document: ReportDocument, evidence: Evidence): ValueReference[] {
  const findings = evaluate(evidence);
  return [...nodesOf(document)].flatMap((node): ValueReference[] => {
    if (node.type === 'liveValue') return [node.attrs.ref];
    if (node.type !== 'chart') return [];
    const chart = findings.charts.get(node.attrs.chart);
    return (chart?.points ?? []).flatMap(({ trials, settings }) => {
      const series = evidence.trials.find(({ id }) => id === trials[0])?.series ?? '';
      const at = { ...settings };
      const quantity = chart?.y ?? '';
      return [
        { kind: 'mean', quantity, series, at },
        ...trials.map((trial) => ({ kind: 'reading' as const, trial, quantity })),
      ] satisfies ValueReference[];
    });
  });
}

/** Every card that can be opened from these, by following each line of each card. */
function cardsFrom(
  references: readonly ValueReference[],
  read: (ref: ValueReference) => ReturnType<typeof provenanceOf>,
): Map<string, ReturnType<typeof provenanceOf>> {
  const cards = new Map<string, ReturnType<typeof provenanceOf>>();
  const open = [...references];
  const follow = (term: ProvenanceTerm): void => {
    if (term.ref) open.push(term.ref);
    term.terms.forEach(follow);
  };
  for (let ref = open.pop(); ref !== undefined; ref = open.pop()) {
    if (cards.has(keyOf(ref))) continue;
    const card = read(ref);
    cards.set(keyOf(ref), card);
    card.terms.forEach(follow);
  }
  return cards;
}

describe.each(REPORTS)('a copy of %s', (_title, evidence, document) => {
  const content = frozen(evidence, document);
  const view = copyViewSchema.parse(JSON.parse(JSON.stringify(buildCopyView(SEALED, content))));
  const copied = { evidence: evidenceOfCopy(view), findings: findingsOfCopy(view) };
  const findings = evaluate(evidence);

  test('every number, and every card that can be opened from it, reads as in the edition', () => {
    const references = referencesOf(document, evidence);
    const there = cardsFrom(references, (ref) => provenanceOf(ref, evidence, findings));
    const here = cardsFrom(references, (ref) => provenanceOf(ref, copied.evidence, copied.findings));

    expect([...here.keys()].sort()).toEqual([...there.keys()].sort());
    for (const [key, { way: _way, ...card }] of there) {
      const { way: _other, ...shown } = here.get(key) ?? { way: null };
      expect({ key, ...shown }).toEqual({ key, ...card });
    }
  });

  test('every claim, table, formula and chart reads as in the edition', () => {
    for (const node of nodesOf(document)) {
      if (node.type === 'claim') {
        expect(claimLine(node.attrs.claim, copied.evidence, copied.findings)).toEqual(
          claimLine(node.attrs.claim, evidence, findings),
        );
      }
      if (node.type === 'trialsTable') {
        expect(trialsTable(node.attrs.series, copied.evidence, copied.findings)).toEqual(
          trialsTable(node.attrs.series, evidence, findings),
        );
      }
      if (node.type === 'formula' && node.attrs.model !== null && node.attrs.defines !== null) {
        const { model, defines, series, at, steps } = node.attrs;
        expect(
          equationSteps({ model, defines, series, at }, steps, copied.evidence, copied.findings),
        ).toEqual(equationSteps({ model, defines, series, at }, steps, evidence, findings));
      }
      if (node.type === 'chart') {
        expect(copied.findings.charts.get(node.attrs.chart)).toEqual(findings.charts.get(node.attrs.chart));
      }
    }
  });

  test('names no operator, time of day, note or rig', () => {
    const text = JSON.stringify(view.evidence);
    for (const member of ['"by"', '"note"', '"rig"', '"withdrawn"', '"assumptions"', '"openBecause"'])
      expect(text).not.toContain(member);
    for (const { at } of evidence.trials) expect(text).not.toContain(at);
  });
});

describe('what a report does not reach', () => {
  const empty: ReportDocument = {
    type: 'doc',
    content: [
      {
        type: 'sectionPhenomenon',
        content: [
          {
            type: 'paragraph',
            content: [
              {
                type: 'liveValue',
                attrs: {
                  ref: { kind: 'count', of: 'trials' },
                  form: 'number',
                  unit: null,
                  shown: 'an older count',
                },
              },
            ],
          },
        ],
      },
      { type: 'sectionModel' },
      { type: 'sectionExperiment' },
      { type: 'sectionComparison' },
      { type: 'sectionConclusion' },
    ],
  };

  test('a report that only counts all trials: the count is told, and no trial, series, model or claim', () => {
    const view = buildCopyView(SEALED, frozen(spout, empty));

    const { evidence } = view;
    expect([evidence.trials, evidence.series, evidence.models, evidence.claims, evidence.quantities]).toEqual(
      [[], [], [], [], []],
    );
    expect(view.findings.values).toEqual({});
    expect(view.findings.sources).toEqual({});
    const shown = showValue(
      { kind: 'count', of: 'trials' },
      'number',
      null,
      evidenceOfCopy(view),
      findingsOfCopy(view),
    );
    expect(shown.text).toBe(
      showValue({ kind: 'count', of: 'trials' }, 'number', null, spout, evaluate(spout)).text,
    );
  });

  test('a live value that last read something else: the older text does not come along', () => {
    expect(JSON.stringify(buildCopyView(SEALED, frozen(spout, empty)))).not.toContain('an older count');
  });

  test('a member that the schema has no place for: is refused', () => {
    const view = buildCopyView(SEALED, frozen(spout, empty));

    expect(copyViewSchema.safeParse({ ...view, notes: [] }).success).toBe(false);
    const withRig = { ...view, evidence: { ...view.evidence, rigs: [] } };
    expect(copyViewSchema.safeParse(withRig).success).toBe(false);
  });
});
