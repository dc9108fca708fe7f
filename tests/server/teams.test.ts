import { afterEach, beforeEach, expect, test } from 'vitest';
import { startTestServer } from '#tests/support/server.ts';
import type { TestServer } from '#tests/support/server.ts';
import { openSocket } from '#tests/support/socket.ts';

let app: TestServer;
beforeEach(async () => {
  app = await startTestServer();
});
afterEach(() => app.stop());

const TERN_ROCK = '/api/teams/tern-rock';

test('team, when one of its people asks: answers its people in order, its season and its fights by date', async () => {
  const odile = await app.signIn('odile');

  const answer = await odile.get(TERN_ROCK);

  expect(answer.status).toBe(200);
  expect(answer.body).toMatchObject({
    slug: 'tern-rock',
    name: 'Tern Rock',
    university: 'Skerry University',
    isDemo: true,
    season: { from: '2026-01-01', to: '2026-05-31' },
  });
  expect(
    answer.body.people.map(({ name, role }: { name: string; role: string }) => `${name}, ${role}`),
  ).toEqual([
    'Ines Farrow, captain',
    'Kasimir Lund, member',
    'Maren Tove, member',
    'Petra Abiola, member',
    'Odile Marsk, advisor',
  ]);
  expect(answer.body.fights.map(({ name, at }: { name: string; at: string }) => `${name} ${at}`)).toEqual([
    'Fight 1 2026-02-14T09:30:00.000Z',
    'Fight 2 2026-03-14T09:30:00.000Z',
    'Fight 3 2026-04-18T09:30:00.000Z',
    'Final 2026-05-23T09:30:00.000Z',
  ]);
});

test('team, when somebody of another team asks: answers as if there were none', async () => {
  const sunniva = await app.signIn('sunniva');

  const foreign = await sunniva.get(TERN_ROCK);
  const absent = await sunniva.get('/api/teams/nowhere');

  expect(foreign.status).toBe(404);
  expect({ ...foreign.body, requestId: '' }).toEqual({ ...absent.body, requestId: '' });
});

test('change role, when the captain makes a member advisor: they read on and write no more', async () => {
  const ines = await app.signIn('ines');
  const kasimir = await app.signIn('kasimir');

  const answer = await ines.patch(`${TERN_ROCK}/members/demo-kasimir`, { role: 'advisor' });

  expect(answer.status).toBe(200);
  expect(answer.body).toEqual({ id: 'demo-kasimir', name: 'Kasimir Lund', role: 'advisor' });
  expect((await kasimir.get(TERN_ROCK)).status).toBe(200);
  const refused = await kasimir.post(`${TERN_ROCK}/problems`, {
    number: 7,
    title: 'Slow Candle',
    statement: 'A candle.',
    tasks: [],
    owners: [],
  });
  expect(refused.status).toBe(403);
});

test('change role, when the person has sockets open: they are closed', async () => {
  const ines = await app.signIn('ines');
  const kasimir = await app.signIn('kasimir');
  const socket = await openSocket(app.url, '/events', kasimir.cookie);

  await ines.patch(`${TERN_ROCK}/members/demo-kasimir`, { role: 'advisor' });

  expect(await socket.closed).toBe(4403);
});

test('change role, when it would leave the team without a captain: answers 409 and says what to do first', async () => {
  const ines = await app.signIn('ines');

  const answer = await ines.patch(`${TERN_ROCK}/members/demo-ines`, { role: 'member' });

  expect(answer.status).toBe(409);
  expect(answer.body).toMatchObject({
    code: 'last-captain',
    detail: 'Ines Farrow is the only captain. Make somebody else captain first.',
  });
  expect((await ines.get('/api/session')).body.teams[0].role).toBe('captain');
});

test('change role, when the person is of another team: answers 404', async () => {
  const ines = await app.signIn('ines');

  const answer = await ines.patch(`${TERN_ROCK}/members/demo-sunniva`, { role: 'member' });

  expect(answer.status).toBe(404);
});

test('change role, when it is done: stands in the audit log with both roles', async () => {
  const ines = await app.signIn('ines');

  await ines.patch(`${TERN_ROCK}/members/demo-maren`, { role: 'captain' });

  const [event] = await app.server.deps.database.models.auditEvents.findAll({
    where: { action: 'change role' },
    raw: true,
  });
  expect(event).toMatchObject({ userId: 'demo-ines', at: '2026-03-03T12:00:00.000Z' });
  expect(JSON.parse(event?.before ?? '')).toEqual([
    { table: 'memberships', id: 'demo-maren', role: 'member' },
  ]);
  expect(JSON.parse(event?.changes ?? '')).toEqual([
    { table: 'memberships', id: 'demo-maren', role: 'captain' },
  ]);
});
