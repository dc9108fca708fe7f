/** The demonstration is entered evidence like any other: what may not be typed may not be seeded. */
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { evidenceSchema } from '#shared/evidence/evidence.ts';
import { evaluate } from '#shared/evidence/evaluate.ts';
import { findValue } from '#shared/evidence/find-value.ts';
import { nodesOf } from '#shared/report/document-text.ts';
import { parseReportDocument } from '#shared/report/schema/parse-report-document.ts';
import { DEMO_PROBLEMS } from '#server/database/seeders/demo/problems.ts';
import { checkDefinition } from '#server/features/evidence/check-definition.ts';
import { DEFINITION_TABLES } from '#server/features/evidence/model.ts';
import { assertReadings } from '#server/features/trials/check-readings.ts';
import { FIRST_START, startTestServer } from '#tests/support/server.ts';
import type { SignedIn, TestServer } from '#tests/support/server.ts';

const worked = DEMO_PROBLEMS.flatMap(({ number, title, work, tasks }) => {
  if (!work) return [];
  const evidence = work.evidence(FIRST_START);
  return [{ number, title, tasks, evidence, report: work.report(evidence) }];
});

describe.each(worked)('problem $number, $title', ({ evidence, report, tasks }) => {
  test('its evidence, as an entry: has the shape of evidence', () => {
    expect(evidenceSchema.parse(evidence)).toEqual(evidence);
  });

  test('its definitions, as entries: would each be taken, and are stored as they would be', () => {
    for (const table of DEFINITION_TABLES) {
      for (const row of evidence[table]) expect(checkDefinition(table, row, evidence)).toEqual(row);
    }
  });

  test('its trials, as entries: would each be taken', () => {
    for (const series of evidence.series) {
      const own = evidence.trials.filter((trial) => trial.series === series.id);
      const named = own.map(({ number, values }) => ({
        name: `${series.letter}${number}`,
        path: '',
        values,
      }));
      expect(() => assertReadings(named, series, evidence)).not.toThrow();
    }
  });

  test('its trials, in order: are numbered from 1 without a gap in each series, and lie before the first start', () => {
    for (const series of evidence.series) {
      const numbers = evidence.trials
        .filter((trial) => trial.series === series.id)
        .map(({ number }) => number);
      expect([...numbers].sort((a, b) => a - b)).toEqual(numbers.map((_, index) => index + 1));
    }
    expect(evidence.trials.filter(({ at }) => new Date(at) > FIRST_START)).toEqual([]);
  });

  test('its tasks, each: have a claim', () => {
    const answered = new Set(evidence.claims.map(({ task }) => task));
    expect(tasks.filter(({ id }) => !answered.has(id))).toEqual([]);
  });

  test('its report, as a document: is of the schema, and every live value in it has its source', () => {
    const findings = evaluate(evidence);

    const parsed = parseReportDocument(report);
    const ties = [...nodesOf(report)].flatMap((node) => (node.type === 'liveValue' ? [node.attrs.ref] : []));

    expect(parsed.ok).toBe(true);
    expect(ties.filter((ref) => findValue(findings, evidence, ref).shape === 'fault')).toEqual([]);
  });
});

test('report of Leaning Spout, as a document: is bound to the trials in more than a dozen places', () => {
  const [spout] = worked;

  const nodes = spout ? [...nodesOf(spout.report)] : [];

  expect(nodes.filter(({ type }) => type === 'liveValue').length).toBeGreaterThan(12);
});

describe('season of the demonstration', () => {
  let app: TestServer;
  let ines: SignedIn;
  beforeAll(async () => {
    app = await startTestServer();
    ines = await app.signIn('ines');
  });
  afterAll(() => app.stop());

  test('Leaning Spout, as evaluate() gives it: two claims hold, one leaks, one is open; two numbers are not tied', async () => {
    const [spout] = (await ines.get('/api/teams/tern-rock/problems')).body;

    expect(spout).toMatchObject({
      number: 1,
      trials: 31,
      claims: { holds: 2, leaks: 1, undecided: 1 },
      notTied: 2,
    });
    expect(spout.levels).toContainEqual({ section: 'Comparison', level: 'Drafted' });
    expect(spout.levels).toContainEqual({ section: 'Conclusion', level: 'Tied' });
  });

  test('Gannet Bank, another team: sees a season of its own without problems', async () => {
    const sunniva = await app.signIn('sunniva');

    expect((await sunniva.get('/api/teams/gannet-bank')).body.isDemo).toBe(true);
    expect((await sunniva.get('/api/teams/gannet-bank/problems')).body).toEqual([]);
  });
});
