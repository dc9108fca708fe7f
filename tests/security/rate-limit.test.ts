import { afterEach, beforeEach, expect, test } from 'vitest';
import { linkIn, readMailFolder } from '#tests/support/mail-folder.ts';
import { startTestServer } from '#tests/support/server.ts';
import type { TestServer } from '#tests/support/server.ts';

let app: TestServer;
beforeEach(async () => {
  app = await startTestServer({ limits: { minutes: 15, failuresPerAddress: 6, failuresPerAccount: 3 } });
});
afterEach(() => app.stop());

const guess = async (email: string) => {
  const stranger = await app.stranger();
  return stranger.post('/api/session', { email, passphrase: 'only a guess' });
};

test('sign in, when one account was guessed at too often: that account is slowed down, even for the right passphrase', async () => {
  const email = 'ines.farrow@skerry.example';
  for (const _attempt of [1, 2, 3]) expect((await guess(email)).status).toBe(401);

  const stranger = await app.stranger();
  const answer = await stranger.post('/api/session', {
    email: 'INES.Farrow@skerry.example',
    passphrase: 'tern rock tide table',
  });

  expect(answer.status).toBe(429);
  expect(answer.type).toBe('application/problem+json');
  expect(answer.body).toMatchObject({
    code: 'too-many-attempts',
    detail: 'This was tried too often. Wait 15 minutes and try again.',
  });
  await app.signIn('kasimir');
});

test('sign in, when an address guesses at many accounts: the address is slowed down', async () => {
  for (const n of [1, 2, 3, 4, 5, 6]) expect((await guess(`person${n}@skerry.example`)).status).toBe(401);

  expect((await guess('person7@skerry.example')).status).toBe(429);
});

test('sign in, when it succeeds again and again: is not counted', async () => {
  for (const _attempt of [1, 2, 3, 4, 5, 6, 7, 8]) await app.signIn('ines');
});

test('change passphrase, when the current one is guessed at too often: is slowed down', async () => {
  const ines = await app.signIn('ines');
  const attempt = () =>
    ines.put('/api/account/password', { current: 'only a guess', next: 'four quiet harbour seals' });
  for (const _attempt of [1, 2, 3]) expect((await attempt()).status).toBe(422);

  expect((await attempt()).status).toBe(429);
});

test('copies, when one address tries token after token: is slowed down, whatever it asks of them', async () => {
  const places = ['', '/standing', '/room', '/questions', '/report.pdf', '/files/x'];
  for (const place of places) {
    const stranger = await app.stranger();
    expect((await stranger.get(`/api/copies/guess${place}`)).status).toBe(404);
  }

  const stranger = await app.stranger();
  expect((await stranger.get('/api/copies/another-guess')).status).toBe(429);
});

test.each(['invitations', 'setup'])(
  '%s, when one address tries link after link: is slowed down',
  async (place) => {
    const attempt = async (n: number) => (await app.stranger()).get(`/api/${place}/guess-${n}`);
    for (const n of [1, 2, 3, 4, 5, 6]) expect((await attempt(n)).status).toBe(404);

    expect((await attempt(7)).status).toBe(429);
  },
);

test.each(['ines.farrow@skerry.example', 'nobody@skerry.example'])(
  'forgotten passphrase, when it is asked for %s again and again: writes no more mail, known or not',
  async (email) => {
    const ask = async () => (await app.stranger()).post('/api/password-resets', { email });
    for (const _attempt of [1, 2, 3]) expect((await ask()).status).toBe(204);

    expect((await ask()).status).toBe(429);
  },
);

test('invited account, when its passphrase is guessed at through the link: is slowed down', async () => {
  const ines = await app.signIn('ines');
  await ines.post('/api/teams/tern-rock/invitations', {
    name: 'Sunniva Dahl',
    email: 'sunniva.dahl@gannet.example',
    role: 'advisor',
  });
  await app.server.deps.mail.wake();
  const [mail = ''] = readMailFolder(app.dataFolder);
  const link = linkIn(mail).replace('/join/', '/api/invitations/');
  const attempt = async () =>
    (await app.stranger()).post(link, { name: 'S', passphrase: 'a guess of twelve' });
  for (const _attempt of [1, 2, 3]) expect((await attempt()).status).toBe(422);

  expect((await attempt()).status).toBe(429);
});
