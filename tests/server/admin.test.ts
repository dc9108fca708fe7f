import { afterEach, beforeEach, expect, test } from 'vitest';
import { createSetupLink } from '#server/features/admin/service.ts';
import { setUpAdministrator, signInAdministrator } from '#tests/support/administrator.ts';
import { linkIn, readMailFolder } from '#tests/support/mail-folder.ts';
import { FIRST_START, SPOUT, startTestServer } from '#tests/support/server.ts';
import type { SignedIn, TestServer } from '#tests/support/server.ts';
import { openSocket } from '#tests/support/socket.ts';

const EIDER = {
  name: 'Eider Ø',
  university: 'Skerry University',
  season: { from: '2026-01-10', to: '2026-05-30' },
  captain: { name: 'Runa Vik', email: 'runa.vik@skerry.example' },
};

let app: TestServer;
let administrator: SignedIn;
beforeEach(async () => {
  app = await startTestServer();
  await setUpAdministrator(app);
  administrator = await signInAdministrator(app);
});
afterEach(() => app.stop());

test('set-up, when there is an administrator: no link is made, and an earlier one opens nothing', async () => {
  expect(await createSetupLink(app.server.deps)).toBeNull();
});

test('set-up link, when it is forged, used or over: is answered the same', async () => {
  const fresh = await startTestServer();
  const link = `/api${new URL((await createSetupLink(fresh.server.deps)) ?? '').pathname}`;
  const stranger = await fresh.stranger();
  const body = { name: 'A', email: 'a@harbour.example', passphrase: 'keys of the harbour office' };

  expect((await stranger.post('/api/setup/forged', body)).status).toBe(404);
  fresh.setNow(new Date(FIRST_START.getTime() + 86_400_000));
  expect((await stranger.post(link, body)).status).toBe(404);
  fresh.setNow(FIRST_START);
  const twice = await Promise.all([stranger.post(link, body), stranger.post(link, body)]);
  expect(twice.map(({ status }) => status).sort()).toEqual([200, 404]);
  await fresh.stop();
});

test('set-up, when the address belongs to somebody of a team: is refused, for an administrator reads no problem', async () => {
  const fresh = await startTestServer();
  const link = `/api${new URL((await createSetupLink(fresh.server.deps)) ?? '').pathname}`;

  const answer = await (
    await fresh.stranger()
  ).post(link, {
    name: 'Ines',
    email: 'ines.farrow@skerry.example',
    passphrase: 'keys of the harbour office',
  });

  expect(answer.status).toBe(422);
  expect(answer.body.fields).toHaveProperty('email');
  await fresh.stop();
});

test('administrator, when asking for a team or a problem: is answered as if there were none', async () => {
  expect((await administrator.get('/api/teams/tern-rock')).status).toBe(404);
  expect((await administrator.get(SPOUT)).status).toBe(404);
  expect((await administrator.get('/api/session')).body).toMatchObject({
    user: { isAdministrator: true },
    teams: [],
  });
});

test('open a team, when its captain accepts: leads a team of its own and invites the others', async () => {
  const made = await administrator.post('/api/admin/teams', EIDER);
  await app.server.deps.mail.wake();
  const [mail = ''] = readMailFolder(app.dataFolder);

  const joined = await (
    await app.stranger()
  ).post(linkIn(mail).replace('/join/', '/api/invitations/'), {
    name: 'Runa Vik',
    passphrase: 'eider down and salt',
  });

  expect(made.status).toBe(201);
  expect(made.body).toMatchObject({
    slug: 'eider',
    people: 0,
    captains: [],
    invited: [{ name: 'Runa Vik' }],
  });
  expect(joined.body).toMatchObject({
    team: 'eider',
    session: { teams: [{ slug: 'eider', role: 'captain' }] },
  });
  const runa = await app.signInWith('runa.vik@skerry.example', 'eider down and salt');
  expect((await runa.get('/api/teams/eider/problems')).body).toEqual([]);
  expect((await runa.get('/api/teams/eider/invitations')).body).toEqual([]);
});

test('open a team, when another has the same name: has an address of its own', async () => {
  await administrator.post('/api/admin/teams', { ...EIDER, name: 'Tern Rock' });

  const { body } = await administrator.get('/api/admin/teams');
  expect(body.map(({ slug }: { slug: string }) => slug).sort()).toEqual([
    'gannet-bank',
    'tern-rock',
    'tern-rock-2',
  ]);
});

test('open a team, when the season ends before it begins: says so beside the field', async () => {
  const season = { from: '2026-05-30', to: '2026-01-10' };
  const { body, status } = await administrator.post('/api/admin/teams', { ...EIDER, season });

  expect(status).toBe(422);
  expect(body.fields['season.to']).toBe('The season must end after it begins.');
});

test('invite a captain, when the team has one: is refused; when that account is locked: goes out', async () => {
  const invite = () => administrator.post('/api/admin/teams/tern-rock/captains', EIDER.captain);

  expect((await invite()).body.code).toBe('has-captain');
  await administrator.patch('/api/admin/people/demo-ines', { isDisabled: true });
  expect((await invite()).status).toBe(201);
});

test('lock an account, when it is signed in: its sessions and sockets end and it cannot sign in until opened', async () => {
  const kasimir = await app.signIn('kasimir');
  const socket = await openSocket(app.url, '/events', kasimir.cookie);

  const answer = await administrator.patch('/api/admin/people/demo-kasimir', { isDisabled: true });

  expect(answer.body).toMatchObject({ name: 'Kasimir Lund', isDisabled: true, teams: ['Tern Rock'] });
  expect(await socket.closed).toBe(4401);
  expect((await kasimir.get('/api/session')).status).toBe(401);
  await expect(app.signIn('kasimir')).rejects.toThrow(/401/);
  await administrator.patch('/api/admin/people/demo-kasimir', { isDisabled: false });
  await app.signIn('kasimir');
});

test('lock an account, when it is one’s own: is refused', async () => {
  const { body } = await administrator.get('/api/admin/people');
  const own = body.find(({ isAdministrator }: { isAdministrator: boolean }) => isAdministrator);

  const answer = await administrator.patch(`/api/admin/people/${own.id}`, { isDisabled: true });

  expect(answer.body.code).toBe('oneself');
});
