import { createHash } from 'node:crypto';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import type { Edition } from '#shared/contracts/editions.ts';
import { editionComparisonSchema } from '#shared/editions/edition-comparison.ts';
import { frozenEditionSchema, type FrozenEdition } from '#shared/editions/frozen-edition.ts';
import { sealFigures, sealOf } from '#shared/editions/seal.ts';
import { editionFigures } from '#shared/editions/edition-figures.ts';
import { printEdition } from '#server/features/editions/edition-pdf.ts';
import { getEdition } from '#server/features/editions/service.ts';
import { readPdf } from './rendering/read-pdf.ts';
import { FIRST_START, SPOUT, startTestServer } from '#tests/support/server.ts';
import type { SignedIn, TestServer } from '#tests/support/server.ts';
import { makeSmallProblem, newMutation } from '#tests/support/small-problem.ts';

const sha256 = (data: string | Uint8Array) => createHash('sha256').update(data).digest('hex');

let app: TestServer;
let ines: SignedIn;
let kasimir: SignedIn;
let newest: number;
beforeAll(async () => {
  app = await startTestServer();
  ines = await app.signIn('ines');
  kasimir = await app.signIn('kasimir');
  newest = (await listOf(SPOUT))[0]?.n ?? 0;
});
afterAll(() => app.stop());

async function listOf(problem: string): Promise<Edition[]> {
  return (await ines.get(`${problem}/editions`)).body as Edition[];
}

const freeze = (who: SignedIn, problem: string, body: object) => who.post(`${problem}/editions`, body);

async function pdfOf(problem: string, n: number): Promise<Buffer> {
  const answer = await ines
    .get(`${problem}/editions/${n}/report.pdf`)
    .buffer(true)
    .parse((response, done) => {
      const chunks: Buffer[] = [];
      response.on('data', (chunk: Buffer) => chunks.push(chunk));
      response.on('end', () => done(null, Buffer.concat(chunks)));
    });
  expect(answer.status).toBe(200);
  expect(answer.get('content-type')).toBe('application/pdf');
  return answer.body as Buffer;
}

async function problemId(number: number): Promise<string> {
  const row = await app.server.deps.database.models.problems.findOne({ where: { number } });
  return row?.id ?? '';
}

describe('freezing', () => {
  test('freeze, when the captain does it: keeps evidence, text, findings and people as they are, under the next number', async () => {
    const answer = await freeze(ines, SPOUT, { note: 'For the second fight', after: newest });

    expect(answer.status).toBe(201);
    const frozen = answer.body as Edition;
    newest += 1;
    expect(frozen).toMatchObject({ n: newest, by: 'Ines Farrow', note: 'For the second fight', trials: 31 });
    expect(frozen.at).toBe(FIRST_START.toISOString());
    expect(await listOf(SPOUT)).toContainEqual(frozen);
    const { content } = (await ines.get(`${SPOUT}/editions/${newest}`)).body as { content: FrozenEdition };
    const { evidence } = (await ines.get(`${SPOUT}/evidence`)).body as { evidence: unknown };
    const { document } = (await ines.get(`${SPOUT}/report`)).body as { document: unknown };
    const findings = (await ines.get(`${SPOUT}/findings`)).body as unknown;
    expect(content.evidence).toEqual(evidence);
    expect(content.document).toEqual(document);
    expect(content.findings).toEqual(findings);
    expect(content.problem.owners).toEqual([
      { name: 'Ines Farrow', role: 'captain' },
      { name: 'Kasimir Lund', role: 'member' },
    ]);
    expect(frozen.tiedNumbers).toBe(editionFigures(content).tiedNumbers);
  });

  test('the seal, when computed again from what the API tells: is the one that was kept', async () => {
    const { edition, content } = (await ines.get(`${SPOUT}/editions/${newest}`)).body as {
      edition: Edition;
      content: FrozenEdition;
    };

    expect(sealOf(content, sha256)).toBe(edition.seal);
  });

  test('freeze, when a trial is logged afterwards: the edition stays as it was', async () => {
    const before = (await ines.get(`${SPOUT}/editions/${newest}`)).text;

    await kasimir.post(`${SPOUT}/series/series-b/trials`, {
      mutationId: newMutation(),
      trials: [
        {
          id: 'later',
          values: { 'q-theta': { text: '38', unit: '°' }, 'q-r': { text: '46.0', unit: 'cm' } },
        },
      ],
    });

    expect((await ines.get(`${SPOUT}/editions/${newest}`)).text).toBe(before);
  });

  test('freeze, when two captains do it at once: one succeeds, the other is told who was first', async () => {
    const { path } = await makeSmallProblem(ines);
    const other = await app.signIn('ines');

    const answers = await Promise.all([
      freeze(ines, path, { note: 'one', after: 0 }),
      freeze(other, path, { note: 'two', after: 0 }),
    ]);

    expect(answers.map(({ status }) => status).sort()).toEqual([201, 409]);
    const refused = answers.find(({ status }) => status === 409);
    expect(refused?.body).toMatchObject({ code: 'frozen-meanwhile' });
    expect(String((refused?.body as { detail: unknown }).detail)).toContain('Ines Farrow froze edition 1');
    expect(await listOf(path)).toHaveLength(1);
  });

  test('freeze, when the captain has seen a newer one than there is: is refused', async () => {
    const answer = await freeze(ines, SPOUT, { note: '', after: 90 });

    expect(answer.status).toBe(422);
  });

  test('freeze, when a member or the advisor does it: is refused', async () => {
    const odile = await app.signIn('odile');

    expect((await freeze(kasimir, SPOUT, { note: '', after: newest })).status).toBe(403);
    expect((await freeze(odile, SPOUT, { note: '', after: newest })).status).toBe(403);
  });

  test('freeze, when done: is in the audit log with its seal', async () => {
    const event = await app.server.deps.database.models.auditEvents.findOne({
      where: { action: `freeze edition ${newest}`, problemId: await problemId(1) },
    });

    expect(event?.changes).toContain('"seal"');
  });
});

describe('reading', () => {
  test.each(['0', '99', 'draft', '1e1', '-1'])(
    'an edition, when asked for as %s: is not there',
    async (n) => {
      expect((await ines.get(`${SPOUT}/editions/${n}`)).status).toBe(404);
      expect((await ines.get(`${SPOUT}/editions/${n}/report.pdf`)).status).toBe(404);
    },
  );

  test('a problem, when nothing was frozen: has no editions', async () => {
    expect(await listOf('/api/teams/tern-rock/problems/9')).toEqual([]);
  });
});

/** What the database's own trigger says, inside Sequelize's error. */
const refusal = (words: string) => ({ parent: { message: expect.stringContaining(words) as string } });

describe('what is frozen', () => {
  test.each([
    ['its content', { content: '{}' }],
    ['its seal', { seal: 'f'.repeat(64) }],
    ['its note', { note: 'other' }],
    ['its day', { frozenAt: '2020-01-01T00:00:00.000Z' }],
    ['its PDF', { pdf: Buffer.from('other'), pdfSha: 'f'.repeat(64) }],
  ])('an edition, when %s is to be changed in the database: refuses', async (_what, change) => {
    const { editions } = app.server.deps.database.models;
    await pdfOf(SPOUT, newest);

    const changing = editions.update(change, { where: { n: newest, problemId: await problemId(1) } });

    await expect(changing).rejects.toMatchObject(refusal('an edition is never changed'));
  });

  test('an edition, when it is to be removed from the database: refuses', async () => {
    const removing = app.server.deps.database.models.editions.destroy({ where: { n: newest } });

    await expect(removing).rejects.toMatchObject(refusal('an edition is never removed'));
  });
});

describe('the PDF', () => {
  test('the PDF, when downloaded twice: is the same to the byte, and its hash is kept', async () => {
    const first = await pdfOf(SPOUT, newest);
    const second = await pdfOf(SPOUT, newest);

    expect(first.equals(second)).toBe(true);
    const edition = (await listOf(SPOUT)).find(({ n }) => n === newest);
    expect(edition?.pdfSha).toBe(sha256(first));
    expect(edition?.pages).toBe((await readPdf(first)).pages.length);
  });

  test('the PDF, when printed again from the kept content: is the same to the byte', async () => {
    const id = await problemId(1);
    const { edition, content } = await getEdition(app.server.deps.database, id, newest);
    const kept = await pdfOf(SPOUT, newest);

    const again = await printEdition(app.server.deps, id, {
      n: newest,
      seal: edition.seal,
      content: frozenEditionSchema.parse(JSON.parse(JSON.stringify(content))),
    });

    expect(sha256(again.bytes)).toBe(sha256(kept));
  });

  test('the PDF, when read: says in the foot which edition it is, its day and the figures of its seal', async () => {
    const { edition } = await getEdition(app.server.deps.database, await problemId(1), newest);
    const { pages } = await readPdf(await pdfOf(SPOUT, newest));

    expect(pages.length).toBeGreaterThan(1);
    for (const text of pages) {
      expect(text).toContain(`Edition ${newest}, 3 March 2026`);
      expect(text).toContain(`seal ${sealFigures(edition.seal)}`);
      expect(text).not.toContain('Draft');
    }
  });
});

describe('laying beside', () => {
  test('an edition and the draft, when a trial was logged since: tell it, and the numbers that follow it', async () => {
    const { body } = await kasimir.get(`${SPOUT}/editions/${newest}/compare/draft`);

    const comparison = editionComparisonSchema.parse(body);
    expect(comparison.trials).toEqual(['1 trial logged: B20.']);
    expect(comparison.values.map(({ name }) => name)).toContain('range on the tray at 38°');
    expect(comparison.passages).toEqual([]);
  });

  test('the demonstration’s two editions, when laid beside each other: tell words, verdicts, trials and definitions', async () => {
    const { body } = await ines.get(`${SPOUT}/editions/1/compare/2`);

    const comparison = editionComparisonSchema.parse(body);
    expect(comparison.trials[0]).toBe('12 trials logged: B1 to B12.');
    expect(comparison.verdicts).toContainEqual(
      expect.objectContaining({ n: 2, before: 'Undecided', after: 'Holds' }) as unknown,
    );
    expect(comparison.definitions.join(' ')).toContain('model 3');
    expect(comparison.passages.length).toBeGreaterThan(5);
  });

  test.each(['1/compare/99', '99/compare/draft', '1/compare/none'])(
    '%s, when asked for: is not there',
    async (path) => {
      expect((await ines.get(`${SPOUT}/editions/${path}`)).status).toBe(404);
    },
  );
});

describe('the demonstration', () => {
  test('its editions, when it was loaded: are two, of 12 and of 24 trials, each with a seal that holds', async () => {
    const [second, first] = (await listOf(SPOUT)).slice(-2);

    expect([first, second].map((edition) => [edition?.n, edition?.trials, edition?.by])).toEqual([
      [1, 12, 'Ines Farrow'],
      [2, 24, 'Ines Farrow'],
    ]);
    for (const n of [1, 2]) {
      const { edition, content } = await getEdition(app.server.deps.database, await problemId(1), n);
      expect(sealOf(content, sha256)).toBe(edition.seal);
    }
  });

  test('the PDF of one, when first asked for by two at once: is printed, and the same bytes are kept for ever', async () => {
    const [first, second] = await Promise.all([pdfOf(SPOUT, 1), pdfOf(SPOUT, 1)]);

    const kept = (await listOf(SPOUT)).find(({ n }) => n === 1);
    expect(sha256(first)).toBe(kept?.pdfSha);
    expect(sha256(second)).toBe(kept?.pdfSha);
    expect((await readPdf(first)).text).toContain('Edition 1, 15 February 2026');
  });
});
