import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import type { ExportState } from '#shared/contracts/report.ts';
import { startTestServer, SPOUT } from '#tests/support/server.ts';
import type { SignedIn, TestServer } from '#tests/support/server.ts';
import { readPdf } from './rendering/read-pdf.ts';

let app: TestServer;
let ines: SignedIn;
beforeAll(async () => {
  app = await startTestServer();
  ines = await app.signIn('ines');
});
afterAll(() => app.stop());

const PATIENCE_MS = 30_000;

async function stateWhenOver(person: SignedIn, id: string): Promise<ExportState> {
  const until = Date.now() + PATIENCE_MS;
  for (;;) {
    const { body } = await person.get(`${SPOUT}/exports/${id}`);
    const state = body as ExportState;
    if (state.state !== 'working' || Date.now() > until) return state;
    await new Promise((resolve) => setTimeout(resolve, 50));
  }
}

async function start(person: SignedIn): Promise<string> {
  const { status, body } = await person.post(`${SPOUT}/exports`, { kind: 'report.pdf' });
  expect(status).toBe(201);
  return (body as { id: string }).id;
}

const getBytes = (person: SignedIn, path: string) =>
  person
    .get(path)
    .buffer(true)
    .parse((response, done) => {
      const chunks: Buffer[] = [];
      response.on('data', (chunk: Buffer) => chunks.push(chunk));
      response.on('end', () => done(null, Buffer.concat(chunks)));
    });

describe('exports', () => {
  test('start export, when the report is there: is made, told, and given as an attachment', async () => {
    const id = await start(ines);

    const state = await stateWhenOver(ines, id);
    const file = await getBytes(ines, `${SPOUT}/exports/${id}/file`);

    expect(state).toEqual({ id, state: 'done', share: 1, at: 'Done' });
    expect(file.headers['content-type']).toBe('application/pdf');
    expect(file.headers['content-disposition']).toBe('attachment; filename="leaning-spout-report.pdf"');
    expect((await readPdf(file.body as Buffer)).text).toContain('Draft, 3 March 2026');
  });

  test('report as PDF in one request, when an advisor asks: has the numbers of the trials', async () => {
    const odile = await app.signIn('odile');

    const file = await getBytes(odile, `${SPOUT}/report.pdf`);

    expect(file.status).toBe(200);
    expect((await readPdf(file.body as Buffer)).text).toMatch(/46\.4 ± 0\.\d cm/u);
  });

  test('report as PDF, when a trial was logged since: has the new mean', async () => {
    const evidence = (await ines.get(`${SPOUT}/evidence`)).body as {
      evidence: {
        series: { id: string; letter: string }[];
        trials: { series: string; number: number; values: object }[];
      };
    };
    const series = evidence.evidence.series.find(({ letter }) => letter === 'B')?.id ?? '';
    const like = evidence.evidence.trials.find((trial) => trial.series === series && trial.number === 10);
    const values = Object.fromEntries(
      Object.entries(like?.values ?? {}).map(([id, reading]: [string, { text: string; unit: string }]) => [
        id,
        reading.unit === 'cm' ? { ...reading, text: '44.9' } : reading,
      ]),
    );
    const before = (await readPdf((await getBytes(ines, `${SPOUT}/report.pdf`)).body as Buffer)).text;

    const logged = await ines.post(`${SPOUT}/series/${series}/trials`, {
      mutationId: 'export-test-1',
      trials: [{ id: 'trial-for-the-pdf', values }],
    });
    const after = (await readPdf((await getBytes(ines, `${SPOUT}/report.pdf`)).body as Buffer)).text;

    expect(logged.status).toBe(201);
    expect(before).not.toContain('44.9');
    expect(after).toContain('B20');
    expect(after).toContain('46.0 ± 0.4 cm');
  });

  test('export, when it is stopped: is over and has no file', async () => {
    const id = await start(ines);

    expect((await ines.delete(`${SPOUT}/exports/${id}`)).status).toBe(204);

    expect((await ines.get(`${SPOUT}/exports/${id}`)).body).toMatchObject({ state: 'cancelled' });
    expect((await ines.get(`${SPOUT}/exports/${id}/file`)).status).toBe(409);
  });

  test('export, when somebody else of the team asks for it: is not there', async () => {
    const id = await start(ines);
    const kasimir = await app.signIn('kasimir');

    expect((await kasimir.get(`${SPOUT}/exports/${id}`)).status).toBe(404);
    expect((await kasimir.get(`${SPOUT}/exports/${id}/file`)).status).toBe(404);
    expect((await kasimir.delete(`${SPOUT}/exports/${id}`)).status).toBe(404);

    await stateWhenOver(ines, id);
  });

  test('export, when another team asks: is not there', async () => {
    const sunniva = await app.signIn('sunniva');

    expect((await sunniva.post(`${SPOUT}/exports`, { kind: 'report.pdf' })).status).toBe(404);
    expect((await sunniva.get(`${SPOUT}/report.pdf`)).status).toBe(404);
  });

  test('export, when two are under way already: is refused with a sentence', async () => {
    const ids = [await start(ines), await start(ines)];

    const third = await ines.post(`${SPOUT}/exports`, { kind: 'report.pdf' });

    expect(third.status).toBe(429);
    expect(third.body).toMatchObject({ code: 'too-many-exports' });
    for (const id of ids) await stateWhenOver(ines, id);
  });

  test('export of another kind, when asked for: is refused', async () => {
    expect((await ines.post(`${SPOUT}/exports`, { kind: 'report.docx' })).status).toBe(422);
  });

  test('an export that is not known, when asked for: is not there', async () => {
    expect((await ines.get(`${SPOUT}/exports/none`)).status).toBe(404);
  });
});
