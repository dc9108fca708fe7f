import { afterEach, beforeEach, expect, test } from 'vitest';
import { startTestServer } from '#tests/support/server.ts';
import type { SignedIn, TestServer } from '#tests/support/server.ts';
import { add, makeSmallProblem, newMutation, recorded } from '#tests/support/small-problem.ts';
import type { SmallProblem } from '#tests/support/small-problem.ts';

let app: TestServer;
let ines: SignedIn;
let small: SmallProblem;
beforeEach(async () => {
  app = await startTestServer();
  ines = await app.signIn('ines');
  small = await makeSmallProblem(ines);
});
afterEach(() => app.stop());

const getEvidence = async () => (await ines.get(`${small.path}/evidence`)).body;

test('evidence, when asked again with its ETag: answers 304 until something changes', async () => {
  const first = await ines.get(`${small.path}/evidence`);
  const etag = String(first.headers.etag);

  const same = await ines.get(`${small.path}/evidence`).set('if-none-match', etag);
  await add(ines, `${small.path}/quantities`, recorded('h', 'head', 'cm'));
  const changed = await ines.get(`${small.path}/evidence`).set('if-none-match', etag);

  expect(etag).toBe(`"${first.body.evidence.version}"`);
  expect(same.status).toBe(304);
  expect(changed.status).toBe(200);
});

test('new definition, when it can be read: answers the row itself, its id and the next version', async () => {
  const { version } = (await getEvidence()).evidence;

  const answer = await ines.post(`${small.path}/quantities`, {
    mutationId: 'm-1',
    row: recorded('h', 'head above the spout', 'cm'),
  });

  expect(answer.status).toBe(201);
  const row = { id: answer.body.id, ...recorded('h', 'head above the spout', 'cm') };
  expect(answer.body).toEqual({
    id: answer.body.id,
    rowVersion: 1,
    version: version + 1,
    mutationId: 'm-1',
    changes: [{ table: 'quantities', id: answer.body.id, row }],
  });
  const after = await getEvidence();
  expect(after.evidence.quantities.at(-1)).toEqual(row);
  expect(after.rowVersions[answer.body.id]).toBe(1);
});

test('new definition, when its answer was lost and it is sent again: is made once', async () => {
  const body = { mutationId: 'm-lost', row: recorded('h', 'head', 'cm') };

  const first = await ines.post(`${small.path}/quantities`, body);
  const again = await ines.post(`${small.path}/quantities`, body);

  expect(again.body).toEqual(first.body);
  expect((await getEvidence()).evidence.quantities).toHaveLength(3);
});

test('replace, when the version fits: the row is new and its version one more', async () => {
  const row = { ...recorded('R', 'range on the table', 'mm') };

  const answer = await ines
    .put(`${small.path}/quantities/${small.range}`, { mutationId: newMutation(), row })
    .set('if-match', '"1"');

  expect(answer.status).toBe(200);
  expect(answer.body.rowVersion).toBe(2);
  const after = await getEvidence();
  expect(after.evidence.quantities[1]).toEqual({ id: small.range, ...row });
  expect(after.rowVersions[small.range]).toBe(2);
});

test('replace, when somebody changed it meanwhile: answers 409 and keeps theirs', async () => {
  const change = (unit: string) =>
    ines
      .put(`${small.path}/quantities/${small.range}`, {
        mutationId: newMutation(),
        row: recorded('R', 'range', unit),
      })
      .set('if-match', '1');
  await change('mm');

  const answer = await change('m');

  expect(answer.status).toBe(409);
  expect(answer.body.code).toBe('changed-meanwhile');
  expect((await getEvidence()).evidence.quantities[1].unit).toBe('mm');
});

test('replace, when the row is not there: answers 404', async () => {
  const answer = await ines
    .put(`${small.path}/quantities/q-absent`, { mutationId: newMutation(), row: recorded('h', 'head', 'cm') })
    .set('if-match', '1');

  expect(answer.status).toBe(404);
});

test('remove, when something uses it: answers 409 and names what does', async () => {
  const answer = await ines.delete(`${small.path}/quantities/${small.range}`, { mutationId: newMutation() });

  expect(answer.status).toBe(409);
  expect(answer.body).toMatchObject({
    code: 'still-used',
    detail: 'Still used by series A. Change that first, then remove this.',
  });
});

test('remove, when nothing uses it: the row is gone and the change says so', async () => {
  const id = await add(ines, `${small.path}/quantities`, recorded('h', 'head', 'cm'));

  const answer = await ines.delete(`${small.path}/quantities/${id}`, { mutationId: newMutation() });

  expect(answer.status).toBe(200);
  expect(answer.body.changes).toEqual([{ table: 'quantities', id, row: null }]);
  const after = await getEvidence();
  expect(after.evidence.quantities).toHaveLength(2);
  expect(after.rowVersions).not.toHaveProperty(id);
});

test('letters and numbers, when the last series or claim was removed: are not given again', async () => {
  const series = (name: string) => ({ name, held: {}, settings: [small.theta], readings: [small.range] });
  const b = await add(ines, `${small.path}/series`, series('second'));
  await ines.delete(`${small.path}/series/${b}`, { mutationId: newMutation() });
  const claim = await add(ines, `${small.path}/claims`, { text: 'It reaches far.', test: null });
  await ines.delete(`${small.path}/claims/${claim}`, { mutationId: newMutation() });

  await add(ines, `${small.path}/series`, series('third'));
  await add(ines, `${small.path}/claims`, { text: 'It reaches further.', test: null });

  const { evidence } = await getEvidence();
  expect(evidence.series.map(({ letter }: { letter: string }) => letter)).toEqual(['A', 'C']);
  expect(evidence.claims.map(({ n }: { n: number }) => n)).toEqual([2]);
});

test('model, when it is stated: bears its number, the date and who stated it; stated anew, the new date', async () => {
  const constant = await add(ines, `${small.path}/quantities`, {
    ...recorded('L', 'length', 'cm'),
    def: { origin: 'constant', reading: { text: '12.0', unit: 'cm' }, parts: [] },
  });
  const row = {
    equations: [{ defines: small.range, expr: `2*{${constant}}` }],
    output: small.range,
    limits: [],
    assumptions: [],
  };
  const id = await add(ines, `${small.path}/models`, row);
  const kasimir = await app.signIn('kasimir');
  app.setNow(new Date('2026-03-05T08:00:00Z'));

  await kasimir.put(`${small.path}/models/${id}`, { mutationId: newMutation(), row }).set('if-match', '1');

  const [change] = (await getEvidence()).evidence.models;
  expect(change).toMatchObject({ n: 1, by: 'Kasimir Lund', at: '2026-03-05T08:00:00.000Z' });
});

test('claim, when only its words change: keeps the time its test was declared; when the test changes: has the new time', async () => {
  const test = {
    kind: 'bound',
    value: { kind: 'count', of: 'trials' },
    side: 'at least',
    limit: { text: '3', unit: '1' },
  };
  const id = await add(ines, `${small.path}/claims`, { text: 'Enough trials.', test });
  app.setNow(new Date('2026-03-05T08:00:00Z'));
  const replace = (row: object, version: number) =>
    ines
      .put(`${small.path}/claims/${id}`, { mutationId: newMutation(), row })
      .set('if-match', String(version));

  const reworded = await replace({ text: 'Trials enough.', test }, 1);
  const reset = await replace(
    { text: 'Trials enough.', test: { ...test, limit: { text: '5', unit: '1' } } },
    2,
  );

  expect(reworded.body.changes[0].row.declaredAt).toBe('2026-03-03T12:00:00.000Z');
  expect(reset.body.changes[0].row.declaredAt).toBe('2026-03-05T08:00:00.000Z');
});

test('every definition, when it changes: stands in the audit log with the row before and after', async () => {
  await ines
    .put(`${small.path}/quantities/${small.range}`, {
      mutationId: 'm-audit',
      row: recorded('R', 'range', 'mm'),
    })
    .set('if-match', '1');

  const event = await app.server.deps.database.models.auditEvents.findOne({
    where: { mutationId: 'm-audit' },
    raw: true,
  });
  expect(event).toMatchObject({ userId: 'demo-ines', action: `change quantities ${small.range}` });
  expect(JSON.parse(event?.before ?? '')[0].unit).toBe('cm');
  expect(JSON.parse(event?.changes ?? '')[0].row.unit).toBe('mm');
});

test('audit log, when a statement tries to alter it: is refused by the database', async () => {
  const { sequelize } = app.server.deps.database;
  const refusal = { parent: { message: expect.stringContaining('audit events are never altered') } };

  const update = sequelize.query("UPDATE audit_events SET action = 'nothing'");
  const removal = sequelize.query('DELETE FROM audit_events');

  await expect(update).rejects.toMatchObject(refusal);
  await expect(removal).rejects.toMatchObject(refusal);
});
