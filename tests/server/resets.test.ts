import { afterEach, beforeEach, expect, test } from 'vitest';
import { linkIn, readMailFolder } from '#tests/support/mail-folder.ts';
import { FIRST_START, startTestServer } from '#tests/support/server.ts';
import type { TestServer } from '#tests/support/server.ts';
import { openSocket } from '#tests/support/socket.ts';

const EMAIL = 'kasimir.lund@skerry.example';
const NEXT = { passphrase: 'four quiet harbour seals' };

let app: TestServer;
beforeEach(async () => {
  app = await startTestServer();
});
afterEach(() => app.stop());

async function ask(email: string): Promise<number> {
  const { status } = await (await app.stranger()).post('/api/password-resets', { email });
  await app.server.deps.mail.wake();
  return status;
}

const links = () =>
  readMailFolder(app.dataFolder).map((mail) => linkIn(mail).replace('/reset/', '/api/password-resets/'));
const use = async (link: string) => (await app.stranger()).put(link, NEXT);

test('forgotten passphrase, when the link is used: the new one signs in, and every session and socket ends', async () => {
  const elsewhere = await app.signIn('kasimir');
  const socket = await openSocket(app.url, '/events', elsewhere.cookie);
  await ask(` ${EMAIL.toUpperCase()}`);

  const answer = await use(links()[0] ?? '');

  expect(answer.status).toBe(204);
  expect(await socket.closed).toBe(4401);
  expect((await elsewhere.get('/api/session')).status).toBe(401);
  await app.signInWith(EMAIL, NEXT.passphrase);
  await expect(app.signIn('kasimir')).rejects.toThrow(/401/);
});

test('forgotten passphrase, when nobody has the address: is answered the same, and no mail is written', async () => {
  expect(await ask('nobody.at.all@skerry.example')).toBe(204);

  expect(readMailFolder(app.dataFolder)).toEqual([]);
});

test('forgotten passphrase, when one of two links is used: the other opens nothing any more', async () => {
  await ask(EMAIL);
  await ask(EMAIL);
  const [first = '', second = ''] = links();

  expect((await use(first)).status).toBe(204);
  expect((await use(second)).status).toBe(404);
  expect((await use(first)).status).toBe(404);
});

test('forgotten passphrase, when an hour has gone by or the link is forged: opens nothing', async () => {
  await ask(EMAIL);
  app.setNow(new Date(FIRST_START.getTime() + 3_600_000));

  expect((await use(links()[0] ?? '')).status).toBe(404);
  expect((await use('/api/password-resets/forged')).status).toBe(404);
  await app.signIn('kasimir');
});

test('forgotten passphrase, when the new one is short: says so and the link stays open', async () => {
  await ask(EMAIL);
  const [link = ''] = links();

  const answer = await (await app.stranger()).put(link, { passphrase: 'short' });

  expect(answer.status).toBe(422);
  expect((await use(link)).status).toBe(204);
});

test('tokens, when they are kept: only as hashes', async () => {
  await ask(EMAIL);
  const token = (links()[0] ?? '').split('/').at(-1);

  const rows = await app.server.deps.database.models.tokens.findAll({ raw: true });
  const mail = await app.server.deps.database.models.outbox.findAll({ raw: true });
  expect(rows).toHaveLength(1);
  expect(JSON.stringify([rows, mail])).not.toContain(token);
});
