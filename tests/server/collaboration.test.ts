/** Writing a report together: who may, what is kept, and what no edit can lose. Real sockets, real SQLite. */
import { afterEach, beforeEach, describe, expect, test } from 'vitest';
import * as Y from 'yjs';
import { REPORT_SECTIONS } from '#shared/report/schema/section-type.ts';
import { compactReport, documentOf } from '#server/features/report/service.ts';
import { openReport, type ReportClient } from '#tests/support/report-client.ts';
import {
  FIRST_START,
  SPOUT,
  startTestServer,
  type DemoName,
  type TestServer,
} from '#tests/support/server.ts';

const PROBLEM = 'demo-problem-1';
let app: TestServer;
let open: ReportClient[];
beforeEach(async () => {
  app = await startTestServer();
  open = [];
});
afterEach(async () => {
  open.forEach((client) => client.close());
  await app.stop();
});

async function writer(name: DemoName, document?: string, token?: string): Promise<ReportClient> {
  const { cookie } = await app.signIn(name);
  const client = openReport(app.url, cookie, document, token);
  open.push(client);
  return client;
}

const stored = async () =>
  JSON.stringify((await documentOf(app.server.deps.database, PROBLEM, FIRST_START)).document);
const until = (check: () => boolean) => expect.poll(check, { timeout: 4000, interval: 10 }).toBe(true);

describe('two writers', () => {
  test('when both type at once: both end with the same text, nothing lost', async () => {
    const [kasimir, maren] = [await writer('kasimir'), await writer('maren')];
    await Promise.all([kasimir.ready, maren.ready]);

    kasimir.type(1, 'The jet leaves at right angles.');
    maren.type(3, 'It lands short.');

    await until(() => kasimir.text().includes('lands short') && maren.text().includes('right angles'));
    await Promise.all([kasimir.kept(), maren.kept()]);
    expect(kasimir.text()).toBe(maren.text());
  });

  test('when both empty everything at once: all five sections stay', async () => {
    const [kasimir, maren] = [await writer('kasimir'), await writer('maren')];
    await Promise.all([kasimir.ready, maren.ready]);

    for (const { doc, fragment } of [kasimir, maren]) {
      doc.transact(() => {
        for (const section of fragment.toArray()) {
          if (section instanceof Y.XmlElement) section.delete(0, section.length);
        }
      });
    }
    await Promise.all([kasimir.kept(), maren.kept()]);

    const { document } = await documentOf(app.server.deps.database, PROBLEM, FIRST_START);
    expect(document.content.map(({ type }) => type)).toEqual(REPORT_SECTIONS.map(({ type }) => type));
  });
});

describe('what is acknowledged', () => {
  test('when the server says kept: it is on disk', async () => {
    const kasimir = await writer('kasimir');
    await kasimir.ready;

    kasimir.type(0, 'Seen on the first afternoon.');
    await kasimir.kept();

    expect(await stored()).toContain('Seen on the first afternoon.');
  });

  test('when the log is drawn together: the text is the same and the log is empty', async () => {
    const kasimir = await writer('kasimir');
    await kasimir.ready;
    for (let n = 0; n < 20; n += 1) kasimir.type(2, `line ${n}`);
    await kasimir.kept();
    const before = await stored();

    await compactReport(app.server.deps.database, PROBLEM, FIRST_START);

    expect(await stored()).toBe(before);
    expect(await app.server.deps.database.models.reportUpdates.count({ where: { problemId: PROBLEM } })).toBe(
      0,
    );
  });

  test('when a report is read that nobody wrote yet: it has five empty sections, made once', async () => {
    const [kasimir, maren] = [
      await writer('kasimir', 'team/tern-rock/problem/12'),
      await writer('maren', 'team/tern-rock/problem/12'),
    ];

    await Promise.all([kasimir.ready, maren.ready]);

    expect(kasimir.fragment.length).toBe(5);
    expect(kasimir.text()).toBe(maren.text());
  });
});

describe('who may', () => {
  test.each([
    ['an older one', 'schema:0'],
    ['none', 'cookie'],
    ['a newer one', 'schema:999'],
  ])('a client whose schema is %s: is refused before anything reaches it', async (_which, token) => {
    const old = await writer('kasimir', undefined, token);

    await expect(old.ready).rejects.toThrow('schema-version');

    expect(old.fragment.length).toBe(0);
  });

  test('a client with an older schema that writes anyway: nothing arrives', async () => {
    const before = await stored();
    const old = await writer('kasimir', undefined, 'schema:0');
    await old.ready.catch(() => undefined);

    old.fragment.insert(0, [new Y.XmlElement('paragraph')]);
    await new Promise((resolve) => setTimeout(resolve, 200));

    expect(await stored()).toBe(before);
  });

  test('an advisor: reads, and cannot write by any message', async () => {
    const before = await stored();
    const advisor = await writer('odile');
    expect(await advisor.ready).toBe('readonly');

    advisor.type(0, 'I would put it differently.');
    await new Promise((resolve) => setTimeout(resolve, 300));

    expect(await stored()).toBe(before);
    const kasimir = await writer('kasimir');
    await kasimir.ready;
    expect(kasimir.text()).not.toContain('differently');
  });

  test('somebody of another team: the report does not exist', async () => {
    const other = await writer('sunniva');

    await expect(other.ready).rejects.toThrow('not-found');
  });

  test('a member who is made advisor while writing: the socket closes, and comes back unable to write', async () => {
    const kasimir = await writer('kasimir');
    expect(await kasimir.ready).toBe('read-write');
    const scopes: string[] = [];
    kasimir.provider.on('authenticated', ({ scope }: { scope: string }) => scopes.push(scope));
    const ines = await app.signIn('ines');

    const answer = await ines.patch('/api/teams/tern-rock/members/demo-kasimir', { role: 'advisor' });

    expect(answer.status).toBeLessThan(300);
    await until(() => scopes.includes('readonly'));
  });

  test('a writer who says another name at the caret: the name of the session is shown', async () => {
    const [kasimir, maren] = [await writer('kasimir'), await writer('maren')];
    await Promise.all([kasimir.ready, maren.ready]);

    kasimir.provider.setAwarenessField('user', { name: 'Ines Farrow', color: '#112233' });

    const names = () =>
      [...(maren.provider.awareness?.getStates().values() ?? [])].map(
        (state) => (state.user as { name?: string })?.name,
      );
    await until(() => names().includes('Kasimir Lund'));
    expect(names()).not.toContain('Ines Farrow');
  });
});

describe('reading it over HTTP', () => {
  test('as an advisor: the document with its schema version', async () => {
    const odile = await app.signIn('odile');

    const answer = await odile.get(`${SPOUT}/report`);

    expect(answer.status).toBe(200);
    expect(answer.body).toMatchObject({ schemaVersion: 1, document: { type: 'doc' } });
  });

  test('of another team: 404', async () => {
    const sunniva = await app.signIn('sunniva');

    expect((await sunniva.get(`${SPOUT}/report`)).status).toBe(404);
  });
});
