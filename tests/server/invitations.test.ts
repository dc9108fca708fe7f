import { afterEach, beforeEach, expect, test } from 'vitest';
import { setUpAdministrator } from '#tests/support/administrator.ts';
import { linkIn, readMailFolder } from '#tests/support/mail-folder.ts';
import { FIRST_START, startTestServer } from '#tests/support/server.ts';
import type { SignedIn, TestServer } from '#tests/support/server.ts';
import { openSocket } from '#tests/support/socket.ts';

const TEAM = '/api/teams/tern-rock';
const TOVE = { name: 'Tove Braaten', email: 'Tove.Braaten@skerry.example', role: 'member' };
const JOINS = { name: 'Tove Braaten', passphrase: 'a tray under the can' };

let app: TestServer;
let ines: SignedIn;
beforeEach(async () => {
  app = await startTestServer();
  ines = await app.signIn('ines');
});
afterEach(() => app.stop());

/** Invites and gives the address of the invitation's link in the API. */
async function invite(person: object = TOVE, captain = ines, team = TEAM): Promise<string> {
  const answer = await captain.post(`${team}/invitations`, person);
  if (answer.status !== 201) throw new Error(`invite: answered ${answer.status} ${answer.text}`);
  await app.server.deps.mail.wake();
  // Mails of one moment are told apart by whom they are for.
  const mail = readMailFolder(app.dataFolder).filter((text) =>
    text.toLowerCase().includes(answer.body.email),
  );
  const links = mail.map((text) => linkIn(text).replace('/join/', '/api/invitations/'));
  const stranger = await app.stranger();
  for (const link of links) if ((await stranger.get(link)).status === 200) return link;
  throw new Error('invite: no mail holds a link that opens');
}

test('invitation, when its link is opened: says who asks whom to join what, and nothing of the team’s work', async () => {
  const link = await invite();

  const answer = await (await app.stranger()).get(link);

  expect(answer.body).toEqual({
    team: 'Tern Rock',
    university: 'Skerry University',
    role: 'member',
    by: 'Ines Farrow',
    name: 'Tove Braaten',
    email: 'tove.braaten@skerry.example',
    until: '2026-03-17T12:00:00.000Z',
    hasAccount: false,
  });
});

test('invitation, when it is accepted: makes the account, joins, signs in, and is used up', async () => {
  const link = await invite();

  const answer = await (await app.stranger()).post(link, JOINS);

  expect(answer.status).toBe(200);
  expect(answer.body).toMatchObject({ team: 'tern-rock', session: { teams: [{ role: 'member' }] } });
  const tove = await app.signInWith('tove.braaten@skerry.example', JOINS.passphrase);
  const { body } = await tove.get(TEAM);
  expect(body.people.at(-1)).toMatchObject({ name: 'Tove Braaten', role: 'member' });
  const waiting = (await ines.get(`${TEAM}/invitations`)).body;
  expect(waiting.map(({ name }: { name: string }) => name)).toEqual(['Tarjei Holm']);
  expect((await (await app.stranger()).post(link, JOINS)).status).toBe(404);
});

test('invitation, when two accept it at once: one joins', async () => {
  const link = await invite();
  const both = [await app.stranger(), await app.stranger()];

  const answers = await Promise.all(both.map((stranger) => stranger.post(link, JOINS)));

  expect(answers.map(({ status }) => status).sort()).toEqual([200, 404]);
});

test('links, when forged, used, withdrawn, replaced or over: are all answered the same', async () => {
  const replaced = await invite();
  const withdrawn = await invite();
  const [{ id }] = (await ines.get(`${TEAM}/invitations`)).body;
  await ines.delete(`${TEAM}/invitations/${id}`);
  const used = await invite({ ...TOVE, email: 'second@skerry.example' });
  await (await app.stranger()).post(used, JOINS);
  const over = await invite({ ...TOVE, email: 'third@skerry.example' });
  app.setNow(new Date(FIRST_START.getTime() + 14 * 86_400_000));

  const stranger = await app.stranger();
  const links = ['/api/invitations/forged', replaced, withdrawn, used, over];
  const answers = await Promise.all(
    links.flatMap((link) => [stranger.get(link), stranger.post(link, JOINS)]),
  );

  for (const { status, body } of answers) {
    expect(status).toBe(404);
    expect(body.detail).toBe(
      'This link opens nothing. It may have been used, or its time is over. Ask for a new one.',
    );
  }
});

test('invitation, when the address has an account: asks for its passphrase and makes no other', async () => {
  const email = 'sunniva.dahl@gannet.example';
  const link = await invite({ name: 'Sunniva Dahl', email, role: 'advisor' });
  const stranger = await app.stranger();
  expect((await stranger.get(link)).body.hasAccount).toBe(true);

  const wrong = await stranger.post(link, { name: 'X', passphrase: 'a passphrase of mine' });
  const right = await stranger.post(link, { name: 'X', passphrase: 'north wind at the pier' });

  expect(wrong.status).toBe(422);
  expect(wrong.body.code).toBe('wrong-passphrase');
  expect(right.body.session.user.name).toBe('Sunniva Dahl');
  expect(right.body.session.teams).toHaveLength(2);
});

test('invitation, when the new passphrase is short: says how long it must be and stays open', async () => {
  const link = await invite();

  const answer = await (await app.stranger()).post(link, { name: 'Tove', passphrase: 'short' });

  expect(answer.body.fields.passphrase).toBe('Use at least 12 characters; four unrelated words do well.');
  expect((await (await app.stranger()).get(link)).status).toBe(200);
});

test('invite, when the person is in the team already: answers 409 beside the address', async () => {
  const answer = await ines.post(`${TEAM}/invitations`, {
    name: 'Kasimir Lund',
    email: 'KASIMIR.lund@skerry.example ',
    role: 'member',
  });

  expect(answer.status).toBe(409);
  expect(answer.body.fields.email).toBe('Somebody of the team has this address already.');
});

test.each([
  ['a name of two lines', { ...TOVE, name: 'Tove\r\nBcc: all@skerry.example' }, 'name'],
  ['no name', { ...TOVE, name: ' ' }, 'name'],
  ['half an address', { ...TOVE, email: 'tove@' }, 'email'],
  ['two addresses', { ...TOVE, email: 'a@skerry.example, b@skerry.example' }, 'email'],
])('invite, when given %s: answers 422 beside it and writes no mail', async (_case, person, field) => {
  const answer = await ines.post(`${TEAM}/invitations`, person);

  expect(answer.status).toBe(422);
  expect(answer.body.fields).toHaveProperty(field);
  expect((await ines.get(`${TEAM}/outbox`)).body).toHaveLength(2);
});

test('administrator, when invited to a team: cannot join, for that account reads no problem', async () => {
  await setUpAdministrator(app);
  const link = await invite({ name: 'H', email: 'halvard.quist@harbour.example', role: 'member' });

  const answer = await (
    await app.stranger()
  ).post(link, {
    name: 'H',
    passphrase: 'keys of the harbour office',
  });

  expect(answer.body.code).toBe('administrator');
});

test('remove, when it is a member: sees the team no more at once, and what they did stays', async () => {
  const kasimir = await app.signIn('kasimir');
  const socket = await openSocket(app.url, '/events', kasimir.cookie);

  const answer = await ines.delete(`${TEAM}/members/demo-kasimir`);

  expect(answer.status).toBe(204);
  expect(await socket.closed).toBe(4403);
  expect((await kasimir.get(TEAM)).status).toBe(404);
  expect((await ines.get(`${TEAM}/problems/1/evidence`)).status).toBe(200);
  expect((await ines.get(`${TEAM}/problems`)).status).toBe(200);
});

test('remove, when it is the only captain: is refused', async () => {
  const answer = await ines.delete(`${TEAM}/members/demo-ines`);

  expect(answer.status).toBe(409);
  expect(answer.body.code).toBe('last-captain');
});

test('audit log, when people are invited, join and go: names who did it and holds no token', async () => {
  const link = await invite();
  await (await app.stranger()).post(link, JOINS);
  await ines.delete(`${TEAM}/members/demo-petra`);

  const events = await app.server.deps.database.models.auditEvents.findAll({ order: ['id'], raw: true });
  const ours = events.slice(-3);
  expect(ours.map(({ action }) => action)).toEqual(['invite', 'join team', 'remove from team']);
  expect(JSON.stringify(ours)).not.toMatch(/token|[\w-]{43}/);
});
