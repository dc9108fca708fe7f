import { afterEach, beforeEach, expect, test } from 'vitest';
import { startTestServer } from '#tests/support/server.ts';
import type { SignedIn, TestServer } from '#tests/support/server.ts';

const FIGHTS = '/api/teams/tern-rock/fights';
const EVENTS = '/api/teams/tern-rock/events';
const FRIENDLY = { name: 'Friendly', at: '2026-01-20T17:00:00.000Z', event: 'demo-event-a', stages: [] };
const INES = { role: 'report', problem: 1, person: 'demo-ines' };

let app: TestServer;
let ines: SignedIn;
beforeEach(async () => {
  app = await startTestServer();
  ines = await app.signIn('ines');
});
afterEach(() => app.stop());

test('fight, when the captain adds one of the past: everybody of the team reads it', async () => {
  const added = await ines.post(FIGHTS, { ...FRIENDLY, stages: [INES], result: 'won' });

  expect(added.status).toBe(201);
  const odile = await app.signIn('odile');
  const read = await odile.get(FIGHTS);
  expect(read.body[0]).toMatchObject({ name: 'Friendly', result: 'won', stages: [INES], rowVersion: 1 });
});

test.each([
  {
    what: 'a problem the team has not',
    stages: [{ role: 'report', problem: 77 }],
    says: 'The team has no problem 77',
  },
  {
    what: 'a person too often',
    stages: [INES, INES, INES],
    says: 'Ines Farrow would take the stage 3 times',
  },
  {
    what: 'an advisor on stage',
    stages: [{ ...INES, person: 'demo-odile' }],
    says: 'Odile Marsk is an advisor',
  },
  { what: 'a stranger', stages: [{ ...INES, person: 'demo-sunniva' }], says: 'not of this team' },
])('fight, with $what: is refused in a sentence', async ({ stages, says }) => {
  const answer = await ines.post(FIGHTS, { ...FRIENDLY, stages });

  expect(answer.status).toBe(422);
  expect(JSON.stringify(answer.body)).toContain(says);
});

test('fight, when two change it from the same state: the second is told, and a removal needs the newest state', async () => {
  const { body: fight } = await ines.post(FIGHTS, FRIENDLY);
  const change = (name: string, version: number) =>
    ines.put(`${FIGHTS}/${fight.id}`, { ...FRIENDLY, name }).set('If-Match', `"${version}"`);

  expect((await change('First', 1)).body).toMatchObject({ name: 'First', rowVersion: 2 });
  expect((await change('Second', 1)).status).toBe(409);
  expect((await ines.delete(`${FIGHTS}/${fight.id}`).set('If-Match', '"1"')).status).toBe(409);
  expect((await ines.delete(`${FIGHTS}/${fight.id}`).set('If-Match', '"2"')).status).toBe(204);
});

test('event, when a fight is held by it: stays; when it is free: is changed and removed', async () => {
  const { body: events } = await ines.get(EVENTS);
  const { id, rowVersion, ...settings } = events[0];
  expect((await ines.delete(`${EVENTS}/${id}`).set('If-Match', `"${rowVersion}"`)).body.code).toBe(
    'event-in-use',
  );

  const { body: own } = await ines.post(EVENTS, { ...settings, name: 'Ours' });
  const changed = await ines
    .put(`${EVENTS}/${own.id}`, { ...settings, name: 'Theirs' })
    .set('If-Match', '"1"');
  expect(changed.body).toMatchObject({ name: 'Theirs', rowVersion: 2 });
  expect((await ines.delete(`${EVENTS}/${own.id}`).set('If-Match', '"2"')).status).toBe(204);
});

test('event, with a block of zero minutes: is refused', async () => {
  const { body: events } = await ines.get(EVENTS);
  const { id: _, rowVersion: __, ...settings } = events[0];
  const blocks = [{ name: 'Report', floor: 'reporter', from: 5, to: 5, isReport: true }];

  expect((await ines.post(EVENTS, { ...settings, blocks })).status).toBe(422);
});
