/**
 * Forbidden words are planted in every place of a problem that a copy must not show; then every byte that a copy can
 * send is searched for them, compressed streams of the PDF included.
 */
import { inflateSync } from 'node:zlib';
import { afterAll, beforeAll, expect, test } from 'vitest';
import request from 'supertest';
import { DEMO_PEOPLE } from '#server/database/seeders/demo/people.ts';
import type { Database } from '#server/database/database.ts';
import type { Trial } from '#shared/evidence/evidence.ts';
import { lend, type Lent } from '#tests/support/lend.ts';
import { SPOUT, startTestServer, type TestServer } from '#tests/support/server.ts';
import { readPdf } from '#tests/server/rendering/read-pdf.ts';

const PROBLEM = { problemId: 'demo-problem-1' };
/** Part of every planted word; parts of its own say where it was planted. */
const PLANTED = 'zqplanted';
/** A reading and a time that stand nowhere else. */
const PLANTED_READING = '77.7177';
const PLANTED_TIME = '13:37:17';

let app: TestServer;
let lent: Lent;
beforeAll(async () => {
  app = await startTestServer();
  await plant(app.server.deps.database);
  const ines = await app.signIn('ines');
  const { n } = (await ines.get(`${SPOUT}/editions`)).body[0] ?? { n: 0 };
  const frozen = await ines.post(`${SPOUT}/editions`, { note: `${PLANTED}-edition-note`, after: n });
  expect(frozen.status).toBe(201);
  lent = await lend(ines);
});
afterAll(() => app.stop());

async function plant(database: Database): Promise<void> {
  const { definitions, trials, problems, tasks } = database.models;
  await database.write(async (transaction) => {
    const change = async (
      table: keyof typeof definitions,
      to: (content: Record<string, unknown>) => Record<string, unknown>,
    ) => {
      for (const row of await definitions[table].findAll({ where: PROBLEM, transaction })) {
        const content = JSON.parse(row.content) as Record<string, unknown>;
        await row.update({ content: JSON.stringify(to(content)) }, { transaction });
      }
    };
    const add = (table: keyof typeof definitions, id: string, content: object) =>
      definitions[table].create(
        { ...PROBLEM, id, position: 90, content: JSON.stringify({ id, ...content }) },
        { transaction },
      );
    await change('instruments', (row) => ({ ...row, note: `${PLANTED}-instrument-note` }));
    await change('series', (row) => ({ ...row, rig: `${PLANTED}-rig` }));
    await change('models', (row) => ({
      ...row,
      by: `${PLANTED}-modeller`,
      assumptions: [{ text: `${PLANTED}-assumption`, neglects: `${PLANTED}-neglected` }],
      limits: (row.limits as object[]).map((limit) => ({ ...limit, reason: `${PLANTED}-limit` })),
    }));
    await add('instruments', 'x-instrument', { name: `${PLANTED}-instrument`, parts: [] });
    await add('quantities', 'x-quantity', {
      symbol: 'Z_q',
      name: `${PLANTED}-quantity`,
      unit: 'cm',
      status: 'measured',
      source: `${PLANTED}-source`,
      def: { origin: 'recorded', instrument: 'x-instrument' },
    });
    await add('series', 'x-series', {
      letter: 'Q',
      name: `${PLANTED}-series`,
      held: {},
      settings: [],
      readings: ['x-quantity'],
    });
    await add('models', 'x-model', {
      n: 90,
      name: `${PLANTED}-model`,
      equations: [{ defines: 'x-quantity', expr: '717.717*{q-h}' }],
      output: 'x-quantity',
      limits: [],
      assumptions: [],
      at: '2026-02-02T10:00:00.000Z',
      by: `${PLANTED}-modeller`,
    });
    await add('comparisons', 'x-comparison', {
      name: `${PLANTED}-comparison`,
      model: 'x-model',
      selection: { series: ['x-series'], plusTrials: [], where: [] },
      free: [],
      weights: 'absolute',
    });
    await add('charts', 'x-chart', {
      n: 90,
      comparison: 'x-comparison',
      x: 'x-quantity',
      sentence: `${PLANTED}-chart`,
    });
    await add('claims', 'x-claim', {
      n: 90,
      text: `${PLANTED}-claim`,
      test: null,
      openBecause: `${PLANTED}-open`,
      declaredAt: '2026-02-02T10:00:00.000Z',
    });
    for (const row of await trials.findAll({ where: PROBLEM, transaction })) {
      const excluded = row.excluded === null ? null : (JSON.parse(row.excluded) as Trial['excluded']);
      await row.update(
        {
          by: `${PLANTED}-operator`,
          note: `${PLANTED}-trial-note`,
          at: `${row.at.slice(0, 10)}T${PLANTED_TIME}.000Z`,
          ...(excluded
            ? {
                excluded: JSON.stringify({
                  ...excluded,
                  by: `${PLANTED}-excluder`,
                  at: `2026-02-02T${PLANTED_TIME}.000Z`,
                }),
              }
            : {}),
        },
        { transaction },
      );
    }
    const [like] = await trials.findAll({ where: PROBLEM, limit: 1, raw: true, transaction });
    if (!like) throw new Error('plant: the demonstration has no trials');
    const reading = { text: PLANTED_READING, unit: 'cm' };
    await trials.create(
      {
        ...like,
        id: 'x-trial',
        seriesId: 'x-series',
        number: 1,
        runOrder: 900,
        values: JSON.stringify({ 'x-quantity': reading }),
      },
      { transaction },
    );
    const values = JSON.parse(like.values) as Record<string, object>;
    await trials.create(
      {
        ...like,
        id: 'x-withdrawn',
        number: 90,
        runOrder: 901,
        values: JSON.stringify({ ...values, 'x-quantity': reading }),
        withdrawn: JSON.stringify({ by: `${PLANTED}-undoer`, at: '2026-02-02T10:00:00.000Z' }),
      },
      { transaction },
    );
    await trials.update(
      { values: JSON.stringify({ ...values, 'x-quantity': reading }) },
      { where: { ...PROBLEM, id: like.id }, transaction },
    );
    await tasks.update({ text: `${PLANTED}-task` }, { where: PROBLEM, transaction });
    await problems.increment('evidenceVersion', { where: { id: PROBLEM.problemId }, transaction });
  });
}

/** Every byte of an answer: its headers, its body, and what is compressed in it. */
async function bytesOf(path: string): Promise<string> {
  const answer = await request(app.url)
    .get(path)
    .buffer(true)
    .parse((response, done) => {
      const chunks: Buffer[] = [];
      response.on('data', (chunk: Buffer) => chunks.push(chunk));
      response.on('end', () => done(null, Buffer.concat(chunks)));
    });
  const body = answer.body as Buffer;
  const texts = [JSON.stringify(answer.headers), body.toString('utf8'), body.toString('latin1')];
  if (answer.type === 'application/pdf') {
    const { text, title, outline, structure } = await readPdf(body);
    texts.push(text, title, outline.join(), JSON.stringify(structure), ...streamsOf(body));
  }
  return texts.join('\n');
}

function streamsOf(file: Buffer): string[] {
  const texts: string[] = [];
  for (let from = file.indexOf('stream\n'); from >= 0; from = file.indexOf('stream\n', from + 7)) {
    try {
      const stream = inflateSync(file.subarray(from + 'stream\n'.length, file.indexOf('endstream', from)));
      texts.push(stream.toString('utf8'), stream.toString('latin1'), stream.toString('utf16le'));
    } catch {
      // Not compressed: its bytes were searched as they are.
    }
  }
  return texts;
}

test('what was planted, when the team itself asks: is there to be found', async () => {
  const ines = await app.signIn('ines');
  const { text } = await ines.get(`${SPOUT}/editions/${lent.copy.edition.n}`);

  for (const word of ['operator', 'trial-note', 'instrument-note', 'rig', 'assumption', 'claim', 'series'])
    expect(text).toContain(`${PLANTED}-${word}`);
  expect(text).toContain(PLANTED_READING);
  expect(text).toContain(PLANTED_TIME);
});

test('every byte of every route of a copy: holds nothing that was planted, no account and no address', async () => {
  const { path } = lent;
  const { view } = (await request(app.url).get(path)).body as { view: { files: string[] } };
  const routes = [
    '',
    '/standing',
    '/report.pdf',
    '/room',
    '/questions',
    ...view.files.map((sha) => `/files/${sha}`),
  ];
  for (const route of routes) {
    const bytes = await bytesOf(path + route);

    expect(bytes.length).toBeGreaterThan(100);
    for (const forbidden of [PLANTED, PLANTED_READING, PLANTED_TIME, '717.717', 'x-series', 'x-trial']) {
      expect({ route, forbidden, isThere: bytes.includes(forbidden) }).toEqual({
        route,
        forbidden,
        isThere: false,
      });
    }
    for (const { id, email } of DEMO_PEOPLE) {
      expect(bytes).not.toContain(id);
      expect(bytes).not.toContain(email);
    }
  }
});

test('a person who only logged trials: is not named; who wrote the report is', async () => {
  const bytes = await bytesOf(lent.path);

  expect(bytes).toContain('Ines Farrow');
  expect(bytes).not.toContain('Petra Abiola');
});
