import { afterEach, beforeEach, expect, test } from 'vitest';
import { startTestServer } from '#tests/support/server.ts';
import type { SignedIn, TestServer } from '#tests/support/server.ts';
import { makeSmallProblem, newMutation } from '#tests/support/small-problem.ts';
import type { SmallProblem } from '#tests/support/small-problem.ts';

let app: TestServer;
let kasimir: SignedIn;
let small: SmallProblem;
beforeEach(async () => {
  app = await startTestServer();
  kasimir = await app.signIn('kasimir');
  small = await makeSmallProblem(kasimir);
});
afterEach(() => app.stop());

const trial = (id: string, angle: string, reach: string) => ({
  id,
  values: { [small.theta]: { text: angle, unit: '°' }, [small.range]: { text: reach, unit: 'cm' } },
});
const log = (person: SignedIn, trials: readonly object[], mutationId = newMutation()) =>
  person.post(`${small.path}/series/${small.series}/trials`, { mutationId, trials });
const change = (person: SignedIn, id: string, what: object) =>
  person.patch(`${small.path}/trials/${id}`, { mutationId: newMutation(), change: what });
const getTrials = async () => (await kasimir.get(`${small.path}/evidence`)).body.evidence.trials;

test('log trials, when readings can be read: numbers them in order, in one step, with who and when', async () => {
  const { version } = (await kasimir.get(`${small.path}/evidence`)).body.evidence;

  const answer = await log(kasimir, [trial('t-1', '10', '36.4'), trial('t-2', '20', '42.3')]);

  expect(answer.status).toBe(201);
  expect(answer.body.version).toBe(version + 1);
  expect(answer.body.changes.map(({ row }: { row: object }) => row)).toEqual([
    {
      id: 't-1',
      number: 1,
      series: small.series,
      order: 1,
      by: 'Kasimir Lund',
      at: '2026-03-03T12:00:00.000Z',
      values: trial('t-1', '10', '36.4').values,
    },
    expect.objectContaining({ id: 't-2', number: 2, order: 2 }),
  ]);
  expect(await getTrials()).toEqual(answer.body.changes.map(({ row }: { row: object }) => row));
});

test('log trials, when the bench gives the time and a note: keeps both as given', async () => {
  const at = '2026-03-03T11:20:00+01:00';

  const answer = await log(kasimir, [{ ...trial('t-1', '10', '36.4'), at, note: 'jet clings' }]);

  expect(answer.body.changes[0].row).toMatchObject({ at, note: 'jet clings' });
});

test('log trials, when the answer was lost and they are sent again: logs them once and answers the same step', async () => {
  const first = await log(kasimir, [trial('t-1', '10', '36.4')], 'm-once');
  await log(kasimir, [trial('t-2', '20', '42.3')]);

  const again = await log(kasimir, [trial('t-1', '10', '36.4')], 'm-once');

  expect(again.status).toBe(201);
  expect(again.body).toEqual(first.body);
  expect(await getTrials()).toHaveLength(2);
});

test('log trials, when an offline bench sends old and new ones together: logs the new ones only', async () => {
  await log(kasimir, [trial('t-1', '10', '36.4')]);

  const answer = await log(kasimir, [trial('t-1', '10', '36.4'), trial('t-2', '20', '42.3')]);

  expect(answer.body.changes.map(({ id }: { id: string }) => id)).toEqual(['t-2']);
  expect(answer.body.changes[0].row.number).toBe(2);
});

test('log trials, when all were logged before under another mutation: answers the step that logged them', async () => {
  const first = await log(kasimir, [trial('t-1', '10', '36.4')]);
  await log(kasimir, [trial('t-2', '20', '42.3')]);

  const again = await log(kasimir, [trial('t-1', '10', '36.4')]);

  expect(again.body.version).toBe(first.body.version);
  expect(again.body.changes).toEqual(first.body.changes);
});

test('log trials, when the id is that of somebody else: answers 409 and changes nothing', async () => {
  const maren = await app.signIn('maren');
  await log(kasimir, [trial('t-1', '10', '36.4')]);

  const answer = await log(maren, [trial('t-1', '30', '46.0')]);

  expect(answer.status).toBe(409);
  expect(answer.body.code).toBe('id-taken');
  expect((await getTrials())[0].values[small.range].text).toBe('36.4');
});

test('log trials, when one of a block cannot be read: logs none and names the trial, the quantity and the field', async () => {
  const answer = await log(kasimir, [trial('t-1', '10', '36.4'), trial('t-2', '20', '1,234.5')]);

  expect(answer.status).toBe(422);
  expect(answer.body.code).toBe('reading-refused');
  expect(answer.body.detail).toMatch(/^Trial 2 of these, R: /);
  expect(Object.keys(answer.body.fields)).toEqual([`trials.1.values.${small.range}.text`]);
  expect(await getTrials()).toEqual([]);
});

test('log trials, when the unit measures something else: says in which unit to write it', async () => {
  const wrong = { ...trial('t-1', '10', '36.4') };
  wrong.values[small.range] = { text: '36.4', unit: 'g' };

  const answer = await log(kasimir, [wrong]);

  expect(answer.status).toBe(422);
  expect(answer.body.fields).toEqual({
    [`trials.0.values.${small.range}.unit`]: 'g does not measure what cm measures. Write it in cm.',
  });
});

test('log trials, when a setting is missing: says that trials are grouped by it', async () => {
  const answer = await log(kasimir, [{ id: 't-1', values: { [small.range]: { text: '36.4', unit: 'cm' } } }]);

  expect(answer.status).toBe(422);
  expect(answer.body.detail).toBe(
    'This trial, θ: its value is missing. Trials of series A are grouped by it.',
  );
});

test('log trials, when the series is not there: answers 404', async () => {
  const answer = await kasimir.post(`${small.path}/series/absent/trials`, {
    mutationId: newMutation(),
    trials: [trial('t-1', '10', '36.4')],
  });

  expect(answer.status).toBe(404);
});

test('correct, when a reading was mistyped: keeps the others, and the audit log has both', async () => {
  await log(kasimir, [trial('t-1', '10', '36.4')]);

  const answer = await change(kasimir, 't-1', {
    kind: 'correct',
    values: { [small.range]: { text: '36.9', unit: 'cm' } },
  });

  expect(answer.status).toBe(200);
  expect(answer.body.changes[0].row.values).toEqual(trial('t-1', '10', '36.9').values);
  const event = await app.server.deps.database.models.auditEvents.findOne({
    where: { version: answer.body.version, action: 'correct trial t-1' },
    raw: true,
  });
  expect(JSON.parse(event?.before ?? '')[0].values[small.range].text).toBe('36.4');
});

test('exclude and bring back, when a member says why: the trial is out with the reason, then in again', async () => {
  const maren = await app.signIn('maren');
  await log(kasimir, [trial('t-1', '10', '36.4')]);

  const out = await change(maren, 't-1', { kind: 'exclude', reason: 'Can slid back' });
  const back = await change(kasimir, 't-1', { kind: 'bring back' });

  expect(out.body.changes[0].row.excluded).toEqual({
    reason: 'Can slid back',
    by: 'Maren Tove',
    at: '2026-03-03T12:00:00.000Z',
  });
  expect(back.body.changes[0].row).not.toHaveProperty('excluded');
});

test('exclude, when no reason is given: asks for one', async () => {
  await log(kasimir, [trial('t-1', '10', '36.4')]);

  const answer = await change(kasimir, 't-1', { kind: 'exclude', reason: ' ' });

  expect(answer.status).toBe(422);
  expect(answer.body.fields).toEqual({ 'change.reason': 'Say why it is left out.' });
});

test('bring back, when the trial is not out: answers 409', async () => {
  await log(kasimir, [trial('t-1', '10', '36.4')]);

  const answer = await change(kasimir, 't-1', { kind: 'bring back' });

  expect(answer.status).toBe(409);
  expect(answer.body.code).toBe('not-possible');
});

test('withdraw, when the logger takes a trial back: it stays in the log, and its number is never given again', async () => {
  await log(kasimir, [trial('t-1', '10', '36.4')]);

  const answer = await change(kasimir, 't-1', { kind: 'withdraw' });
  const next = await log(kasimir, [trial('t-2', '20', '42.3')]);

  expect(answer.body.changes[0].row.withdrawn).toEqual({
    by: 'Kasimir Lund',
    at: '2026-03-03T12:00:00.000Z',
  });
  expect(next.body.changes[0].row.number).toBe(2);
  expect(await getTrials()).toHaveLength(2);
});

test('withdraw, when somebody else logged it: answers 409 and offers leaving it out', async () => {
  const maren = await app.signIn('maren');
  await log(kasimir, [trial('t-1', '10', '36.4')]);

  const answer = await change(maren, 't-1', { kind: 'withdraw' });

  expect(answer.status).toBe(409);
  expect(answer.body.detail).toBe(
    'Only Kasimir Lund, who logged this trial, takes it back. Leave it out with a reason instead.',
  );
});

test('change a trial, when it is not there: answers 404', async () => {
  expect((await change(kasimir, 'absent', { kind: 'bring back' })).status).toBe(404);
});

test('log trials, when fifty are sent at once by two people: none is lost and every number and version is given once', async () => {
  const maren = await app.signIn('maren');
  const { version } = (await kasimir.get(`${small.path}/evidence`)).body.evidence;
  const people = [kasimir, maren];

  const answers = await Promise.all(
    Array.from({ length: 50 }, (_, index) =>
      log(people[index % 2] ?? kasimir, [trial(`t-${index}`, '10', '36.4')]),
    ),
  );

  expect(new Set(answers.map(({ status }) => status))).toEqual(new Set([201]));
  const numbers = (await getTrials()).map(({ number }: { number: number }) => number);
  expect(numbers).toEqual(Array.from({ length: 50 }, (_, index) => index + 1));
  const versions = answers.map(({ body }) => body.version).sort((a, b) => a - b);
  expect(versions).toEqual(Array.from({ length: 50 }, (_, index) => version + 1 + index));
});
