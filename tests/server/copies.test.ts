/** Copies: lent by the captain, read without an account, questioned behind a key, taken back. */
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import request from 'supertest';
import type { Copy } from '#shared/contracts/copies.ts';
import { freeze, hours, lend, type Lent } from '#tests/support/lend.ts';
import {
  FIRST_START,
  SPOUT,
  startTestServer,
  type SignedIn,
  type TestServer,
} from '#tests/support/server.ts';
import { readPdf } from './rendering/read-pdf.ts';

let app: TestServer;
let ines: SignedIn;
beforeAll(async () => {
  // Every call of these tests comes from one address, and many of them are refused.
  app = await startTestServer({
    limits: { minutes: 15, failuresPerAddress: 1000, failuresPerAccount: 10 },
  });
  ines = await app.signIn('ines');
});
afterAll(() => app.stop());

/** Cookies that an answer hangs on the browser, for its next request. */
function cookiesOf(answer: request.Response): string {
  return (answer.get('Set-Cookie') ?? []).map((line) => line.split(';')[0]).join('; ');
}

/** The answer without what differs from request to request. */
function told(answer: request.Response) {
  const { requestId: _requestId, ...body } = answer.body as Record<string, unknown>;
  return { status: answer.status, type: answer.type, body };
}

async function withCookie(person: SignedIn, cookie: string) {
  return {
    get: (path: string) => request(app.url).get(path).set('cookie', `${person.cookie}; ${cookie}`),
    send: (method: 'post' | 'patch' | 'delete', path: string, body: object = {}) => {
      const calling = request(app.url);
      const call = calling[method](path).set('cookie', `${person.cookie}; ${cookie}`);
      return call.set('x-csrf-token', person.token).send(body);
    },
  };
}

describe('lending', () => {
  test('the captain lends an edition: the token is told once and kept nowhere', async () => {
    const { copy, token } = await lend(ines, { passphrase: 'north wind' });

    expect(token).toMatch(/^[\w-]{43}$/);
    expect(copy).toMatchObject({
      recipient: 'Gannet Bank',
      reader: 'opponent',
      standing: 'open',
      hasPassphrase: true,
      lentBy: 'Ines Farrow',
      views: { opened: 0, printed: 0 },
    });
    const [tables] = await app.server.deps.database.sequelize.query('SELECT * FROM copies');
    const [audit] = await app.server.deps.database.sequelize.query('SELECT * FROM audit_events');
    const kept = JSON.stringify([tables, audit]);
    expect(kept).not.toContain(token);
    expect(kept).not.toContain('north wind');
    expect((await ines.get(`${SPOUT}/copies`)).text).not.toContain(token);
  });

  test('lending, when it ends before it begins or is over already: says so beside the field', async () => {
    const n = await freeze(ines);
    const wanted = { recipient: 'Low Skerry', reader: 'reviewer', passphrase: null, mayPrint: false };

    for (const times of [
      { from: hours(5), until: hours(4) },
      { from: hours(-9), until: hours(-1) },
    ]) {
      const answer = await ines.post(`${SPOUT}/editions/${n}/copies`, { ...wanted, ...times });
      expect(answer.status).toBe(422);
      expect(answer.body.fields).toHaveProperty('until');
    }
    expect(
      (
        await ines.post(`${SPOUT}/editions/99/copies`, {
          ...wanted,
          from: hours(0),
          until: hours(2),
        })
      ).status,
    ).toBe(404);
  });

  test('members and advisor, when they ask: see what is out, and cannot lend or take back', async () => {
    const { copy } = await lend(ines);
    for (const name of ['kasimir', 'odile'] as const) {
      const person = await app.signIn(name);

      const list = (await person.get(`${SPOUT}/copies`)).body as Copy[];
      expect(list.map(({ id }) => id)).toContain(copy.id);
      const change = await person.patch(`${SPOUT}/copies/${copy.id}`, { takenBack: true });
      expect(change.status).toBe(403);
      expect((await person.get(`${SPOUT}/copies/${copy.id}/preview`)).status).toBe(403);
    }
  });

  test('a team that is here, when a copy is lent to it: sees it in its own list, without a way in', async () => {
    const { copy, token } = await lend(ines, { recipient: 'gannet bank' });
    const sunniva = await app.signIn('sunniva');

    const answer = await sunniva.get('/api/teams/gannet-bank/copies');
    const { lent, borrowed } = answer.body as { lent: unknown[]; borrowed: Record<string, unknown>[] };
    expect(lent).toEqual([]);
    expect(borrowed.find(({ id }) => id === copy.id)).toMatchObject({
      team: 'Tern Rock',
      problem: { number: 1, title: 'Leaning Spout' },
      standing: 'open',
    });
    expect(answer.text).not.toContain(token);
    expect(Object.keys(borrowed[0] ?? {})).not.toContain('views');
    expect((await sunniva.get(`${SPOUT}/copies`)).status).toBe(404);
    expect((await sunniva.patch(`${SPOUT}/copies/${copy.id}`, { takenBack: true })).status).toBe(404);
  });
});

describe('reading', () => {
  test('who holds the token, when it is open: reads without an account, and each opening is logged once', async () => {
    const { copy, path } = await lend(ines);

    const answer = await request(app.url).get(path);
    await request(app.url).get(path);
    expect(answer.status).toBe(200);
    expect(answer.headers['cache-control']).toBe('no-store');
    expect(answer.body).toMatchObject({ recipient: 'Gannet Bank', mayAsk: true, number: copy.number });
    expect(answer.body.view).toMatchObject({
      problem: { title: 'Leaning Spout' },
      team: { name: 'Tern Rock' },
    });
    const list = (await ines.get(`${SPOUT}/copies`)).body as Copy[];
    expect(list.find(({ id }) => id === copy.id)?.views).toEqual({
      opened: 1,
      printed: 0,
      firstAt: FIRST_START.toISOString(),
      lastAt: FIRST_START.toISOString(),
    });
  });

  test('the team that lent it, when it opens the address itself: reads it, is not counted, and may not ask', async () => {
    const { copy, path } = await lend(ines);
    const kasimir = await app.signIn('kasimir');

    expect((await kasimir.get(path)).body).toMatchObject({ mayAsk: false });
    const list = (await ines.get(`${SPOUT}/copies`)).body as Copy[];
    expect(list.find(({ id }) => id === copy.id)?.views.opened).toBe(0);
  });

  test('the captain, when previewing: gets the very view of the reader, and no questions', async () => {
    const { copy, path } = await lend(ines);

    const preview = await ines.get(`${SPOUT}/copies/${copy.id}/preview`);
    const read = await request(app.url).get(path);
    expect(preview.body.view).toEqual(read.body.view);
    expect(preview.body.mayAsk).toBe(false);
  });

  test('tokens that open nothing: forged, unknown, too early, too late and taken back are answered alike', async () => {
    const early = await lend(ines, { from: hours(20), until: hours(30) });
    const late = await lend(ines, { until: hours(1) });
    const taken = await lend(ines);
    await ines.patch(`${SPOUT}/copies/${taken.copy.id}`, { takenBack: true });
    const open = await lend(ines);
    const forged = open.path.slice(0, -1) + (open.path.endsWith('A') ? 'B' : 'A');
    app.setNow(new Date(hours(2)));

    const stranger = await app.stranger();
    const places = ['', '/standing', '/report.pdf', `/files/${'0'.repeat(64)}`, '/room', '/questions'];
    for (const place of places) {
      const answers = await Promise.all(
        [early.path, late.path, taken.path, forged, '/api/copies/x', `/api/copies/${'a'.repeat(43)}`].map(
          async (path) => told(await request(app.url).get(path + place)),
        ),
      );
      expect(answers[0]).toMatchObject({ status: 404, body: { code: 'not-found' } });
      for (const answer of answers) expect(answer).toEqual(answers[0]);
    }
    const entering = await Promise.all(
      [early.path, late.path, taken.path, forged].map(async (path) =>
        told(await stranger.post(`${path}/room`, { key: 'a key of ours' })),
      ),
    );
    for (const answer of entering) expect(answer).toEqual(entering[0]);
    expect(entering[0]?.status).toBe(404);
    app.setNow(FIRST_START);
  });

  test('a copy with a passphrase: asks for it before anything, and remembers it for this copy alone', async () => {
    const first = await lend(ines, { passphrase: 'north wind' });
    const second = await lend(ines, { passphrase: 'north wind' });
    const stranger = await app.stranger();

    for (const place of ['', '/standing', '/report.pdf', '/room', '/questions']) {
      const answer = await request(app.url).get(first.path + place);
      expect(answer.body).toMatchObject({ status: 403, code: 'passphrase-needed' });
      expect(answer.text).not.toContain('Spout');
    }
    const wrong = await stranger.post(`${first.path}/opening`, { passphrase: 'south wind' });
    expect(wrong.body).toMatchObject({ status: 422, code: 'wrong-passphrase' });
    expect(wrong.get('Set-Cookie')).toBeUndefined();
    const right = await stranger.post(`${first.path}/opening`, { passphrase: 'north wind' });
    expect(right.status).toBe(204);
    expect(right.get('Set-Cookie')?.[0]).toMatch(/HttpOnly; SameSite=Strict/);
    expect(right.get('Set-Cookie')?.[0]).toContain(`Path=${first.path}`);
    const cookie = cookiesOf(right);
    expect((await request(app.url).get(first.path).set('cookie', cookie)).status).toBe(200);
    expect((await request(app.url).get(second.path).set('cookie', cookie)).status).toBe(403);
    app.setNow(new Date(hours(13)));
    expect((await request(app.url).get(first.path).set('cookie', cookie)).status).toBe(403);
    app.setNow(FIRST_START);
  });

  test('the report for paper: where it is allowed, it names the recipient and the number on every page, and is logged', async () => {
    const { copy, path } = await lend(ines, { recipient: 'Long Skerry' });
    const forScreen = await lend(ines, { mayPrint: false });

    const answer = await request(app.url)
      .get(`${path}/report.pdf`)
      .buffer(true)
      .parse((response, done) => {
        const chunks: Buffer[] = [];
        response.on('data', (chunk: Buffer) => chunks.push(chunk));
        response.on('end', () => done(null, Buffer.concat(chunks)));
      });
    expect(answer.status).toBe(200);
    const { pages } = await readPdf(answer.body as Buffer);
    expect(pages.length).toBeGreaterThan(2);
    for (const page of pages) {
      expect(page.split(`Lent to Long Skerry, copy ${copy.number}`).length - 1).toBe(4);
    }
    const list = (await ines.get(`${SPOUT}/copies`)).body as Copy[];
    expect(list.find(({ id }) => id === copy.id)?.views.printed).toBe(1);
    expect((await request(app.url).get(`${forScreen.path}/report.pdf`)).body).toMatchObject({
      status: 403,
      code: 'not-for-print',
    });
  });
});

describe('taking back', () => {
  test('a copy that is open on a screen, when it is taken back: nothing more is answered', async () => {
    const { copy, path } = await lend(ines);
    expect((await request(app.url).get(`${path}/standing`)).status).toBe(200);

    const answer = await ines.patch(`${SPOUT}/copies/${copy.id}`, { takenBack: true });
    expect(answer.body).toMatchObject({ standing: 'taken back', takenBackAt: FIRST_START.toISOString() });
    expect((await request(app.url).get(`${path}/standing`)).status).toBe(404);
    expect((await request(app.url).get(path)).status).toBe(404);
    const again = await ines.patch(`${SPOUT}/copies/${copy.id}`, { until: hours(70) });
    expect(again.body).toMatchObject({ status: 409, code: 'taken-back' });
  });

  test('until when it is open, when the captain changes it: the copy ends then', async () => {
    const { copy, path } = await lend(ines);

    const answer = await ines.patch(`${SPOUT}/copies/${copy.id}`, { until: hours(3) });
    expect(answer.body.until).toBe(hours(3));
    app.setNow(new Date(hours(3)));
    expect((await request(app.url).get(path)).status).toBe(404);
    app.setNow(FIRST_START);
  });

  test('the audit log, when a copy is lent and taken back: says who did it and to whom', async () => {
    const { copy } = await lend(ines, { recipient: 'Low Skerry' });
    await ines.patch(`${SPOUT}/copies/${copy.id}`, { takenBack: true });

    const events = await app.server.deps.database.models.auditEvents.findAll({
      order: [['id', 'DESC']],
      limit: 2,
      raw: true,
    });
    expect(events.map(({ action, userId }) => [action, userId])).toEqual([
      [`take back copy ${copy.number}`, 'demo-ines'],
      [expect.stringMatching(/^lend edition \d+$/), 'demo-ines'],
    ]);
    expect(events[0]?.changes).toContain('Low Skerry');
  });
});

describe('questions', () => {
  const ABOUT = { kind: 'passage', from: 12, to: 31, quote: 'the gap widens with lean' };

  async function openRoom(lent: Lent) {
    const stranger = await app.stranger();
    const answer = await stranger.post(`${lent.path}/room`, { key: 'gannets dive at noon' });
    expect(answer.status).toBe(204);
    return { stranger, reader: await withCookie(stranger, cookiesOf(answer)) };
  }

  test('the first opener sets the key; whoever comes later needs it', async () => {
    const lent = await lend(ines);
    expect((await request(app.url).get(`${lent.path}/room`)).body).toEqual({ keySetAt: null, isOpen: false });
    const { reader } = await openRoom(lent);
    const second = await app.stranger();

    expect((await reader.get(`${lent.path}/room`)).body).toEqual({
      keySetAt: FIRST_START.toISOString(),
      isOpen: true,
    });
    expect((await second.get(`${lent.path}/questions`)).body).toMatchObject({
      status: 403,
      code: 'key-needed',
    });
    const wrong = await second.post(`${lent.path}/room`, { key: 'gannets dive at ten' });
    expect(wrong.body).toMatchObject({ status: 422, code: 'wrong-key' });
    const right = await second.post(`${lent.path}/room`, { key: 'gannets dive at noon' });
    expect(right.status).toBe(204);
    const [rooms] = await app.server.deps.database.sequelize.query('SELECT * FROM copy_rooms');
    expect(JSON.stringify(rooms)).not.toContain('gannets');
  });

  test('questions: are written, changed, put in another order and removed', async () => {
    const lent = await lend(ines);
    const { reader } = await openRoom(lent);
    const path = `${lent.path}/questions`;
    for (const text of ['One?', 'Two?', 'Three?']) {
      expect((await reader.send('post', path, { text, about: ABOUT, seconds: 30 })).status).toBe(201);
    }
    const texts = async () =>
      ((await reader.get(path)).body as { questions: { id: string; text: string }[] }).questions;
    const [one, , three] = await texts();

    await reader.send('patch', `${path}/${three?.id}`, { place: 0, seconds: 45 });
    await reader.send('patch', `${path}/${one?.id}`, { text: 'One, again?', about: null });
    expect(await texts()).toMatchObject([
      { text: 'Three?', seconds: 45, about: ABOUT },
      { text: 'One, again?', about: null },
      { text: 'Two?' },
    ]);
    await reader.send('delete', `${path}/${three?.id}`);
    expect((await texts()).map(({ text }) => text)).toEqual(['One, again?', 'Two?']);
    expect((await reader.send('delete', `${path}/absent`)).status).toBe(404);
    expect((await reader.send('patch', `${lent.path}/room`, { seconds: 180 })).body.seconds).toBe(180);
  });

  test('the 41st question: is refused with a sentence', async () => {
    const lent = await lend(ines);
    const { reader } = await openRoom(lent);
    const add = () =>
      reader.send('post', `${lent.path}/questions`, { text: 'Why?', about: null, seconds: 5 });
    for (let n = 0; n < 40; n++) await add();

    expect((await add()).body).toMatchObject({ status: 409, code: 'too-many-questions' });
  });

  test('the team that lent it, even with token and key: finds no room and no question by any route', async () => {
    const lent = await lend(ines);
    const { reader } = await openRoom(lent);
    await reader.send('post', `${lent.path}/questions`, { text: 'A secret?', about: null, seconds: 30 });
    const [{ id }] = (await reader.get(`${lent.path}/questions`)).body.questions;
    const key = cookiesOf(
      await (await app.stranger()).post(`${lent.path}/room`, { key: 'gannets dive at noon' }),
    );

    for (const name of ['ines', 'kasimir', 'odile'] as const) {
      const own = await withCookie(await app.signIn(name), key);
      const answers = [
        await own.get(`${lent.path}/room`),
        await own.send('post', `${lent.path}/room`, { key: 'gannets dive at noon' }),
        await own.send('patch', `${lent.path}/room`, { seconds: 60 }),
        await own.get(`${lent.path}/questions`),
        await own.send('post', `${lent.path}/questions`, { text: 'Ours?', about: null, seconds: 30 }),
        await own.send('patch', `${lent.path}/questions/${id}`, { text: 'Ours?' }),
        await own.send('delete', `${lent.path}/questions/${id}`),
      ];
      expect(answers.map(({ status }) => status)).toEqual(answers.map(() => 404));
      const seen = [
        await own.get(lent.path),
        await ines.get(`${SPOUT}/copies`),
        await ines.get(`${SPOUT}/copies/${lent.copy.id}/preview`),
        await ines.get('/api/teams/tern-rock/copies'),
      ];
      for (const { text } of [...answers, ...seen]) expect(text).not.toContain('A secret?');
    }
    expect((await reader.get(`${lent.path}/questions`)).body.questions).toHaveLength(1);
  });

  test('a person of another team, with token and key: may write', async () => {
    const lent = await lend(ines);
    await openRoom(lent);
    const sunniva = await app.signIn('sunniva');
    const key = cookiesOf(await sunniva.post(`${lent.path}/room`, { key: 'gannets dive at noon' }));
    const reader = await withCookie(sunniva, key);

    expect(
      (await reader.send('post', `${lent.path}/questions`, { text: 'Why?', about: null, seconds: 30 }))
        .status,
    ).toBe(201);
  });

  test('after the copy was taken back: the questions stay readable with the key, and cannot be changed', async () => {
    const lent = await lend(ines);
    const { reader, stranger } = await openRoom(lent);
    await reader.send('post', `${lent.path}/questions`, { text: 'Why?', about: ABOUT, seconds: 30 });
    await ines.patch(`${SPOUT}/copies/${lent.copy.id}`, { takenBack: true });

    expect((await reader.get(`${lent.path}/questions`)).body.questions).toMatchObject([{ text: 'Why?' }]);
    const later = await stranger.post(`${lent.path}/room`, { key: 'gannets dive at noon' });
    expect(later.status).toBe(204);
    expect((await stranger.get(`${lent.path}/questions`)).status).toBe(404);
    expect((await stranger.post(`${lent.path}/room`, { key: 'not this one' })).status).toBe(404);
    expect(
      (await reader.send('post', `${lent.path}/questions`, { text: 'More?', about: null, seconds: 30 }))
        .status,
    ).toBe(404);
  });
});

test('log, when copies are read and questioned: holds no token', async () => {
  const { path, token } = await lend(ines);
  await request(app.url).get(path);
  await request(app.url).get(`${path}/questions?key=x`);

  const log = app.log.join('');
  expect(log).not.toContain(token);
  expect(log).toContain('/api/copies/…/questions');
});
