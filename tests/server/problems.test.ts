import { afterEach, beforeEach, expect, test } from 'vitest';
import { SPOUT, startTestServer } from '#tests/support/server.ts';
import type { TestServer } from '#tests/support/server.ts';

let app: TestServer;
beforeEach(async () => {
  app = await startTestServer();
});
afterEach(() => app.stop());

const PROBLEMS = '/api/teams/tern-rock/problems';
const CANDLE = {
  number: 7,
  title: 'Slow Candle',
  statement: 'A candle burns under a jar. For how long?',
  tasks: ['For how long does it burn?', 'What ends it?'],
  owners: ['demo-petra'],
};

test('problems, when somebody of the team asks: lists them by number with owners and what the next fight asks of them', async () => {
  const ines = await app.signIn('ines');

  const answer = await ines.get(PROBLEMS);

  expect(answer.status).toBe(200);
  const lines = answer.body.map(
    ({
      number,
      title,
      stage,
      owners,
    }: {
      number: number;
      title: string;
      stage: string | null;
      owners: { name: string }[];
    }) => `${number} ${title}, ${stage}, ${owners.map(({ name }) => name).join(' and ')}`,
  );
  expect(lines).toEqual([
    '1 Leaning Spout, report, Ines Farrow and Kasimir Lund',
    '4 Falling Cups, review, Maren Tove and Petra Abiola',
    '6 Braked Magnet, oppose, Kasimir Lund and Maren Tove',
    '9 Stubborn Bubble, null, Petra Abiola and Ines Farrow',
    '12 Sand Roller, null, Petra Abiola',
  ]);
});

test('problems, when the next fight is over: the stages of the one after it count', async () => {
  const ines = await app.signIn('ines');
  app.setNow(new Date('2026-03-15T12:00:00Z'));

  const answer = await ines.get(PROBLEMS);

  expect(answer.body.map(({ stage }: { stage: unknown }) => stage)).toEqual([null, null, null, null, null]);
});

test('new problem, when a member gives its tasks: each becomes a claim whose test is not chosen', async () => {
  const petra = await app.signIn('petra');

  const answer = await petra.post(PROBLEMS, CANDLE);

  expect(answer.status).toBe(201);
  expect(answer.body).toEqual({ number: 7 });
  const problem = await petra.get(`${PROBLEMS}/7`);
  expect(problem.body).toMatchObject({
    number: 7,
    title: 'Slow Candle',
    owners: [{ id: 'demo-petra', name: 'Petra Abiola', role: 'member' }],
    settings: { k: 2, rounding: 'two digits', level: 0.95, paper: 'A4' },
    rowVersion: 1,
  });
  const { evidence } = (await petra.get(`${PROBLEMS}/7/evidence`)).body;
  expect(evidence.version).toBe(1);
  expect(evidence.claims).toEqual([
    expect.objectContaining({
      n: 1,
      text: 'For how long does it burn?',
      test: null,
      task: problem.body.tasks[0].id,
    }),
    expect.objectContaining({ n: 2, text: 'What ends it?', test: null, task: problem.body.tasks[1].id }),
  ]);
});

test('new problem, when its number is taken: answers 409 beside the field and keeps the other', async () => {
  const petra = await app.signIn('petra');

  const answer = await petra.post(PROBLEMS, { ...CANDLE, number: 1 });

  expect(answer.status).toBe(409);
  expect(answer.body.code).toBe('number-taken');
  expect(answer.body.fields).toEqual({
    number: 'The team has a problem 1 already. Give this one another number.',
  });
  expect((await petra.get(SPOUT)).body.title).toBe('Leaning Spout');
});

test('new problem, when an owner is not of the team: answers 422 beside the owners', async () => {
  const petra = await app.signIn('petra');

  const answer = await petra.post(PROBLEMS, { ...CANDLE, owners: ['demo-sunniva'] });

  expect(answer.status).toBe(422);
  expect(answer.body.fields).toEqual({ owners: 'Owners are people of the team. Choose them from the list.' });
  expect((await petra.get(`${PROBLEMS}/7`)).status).toBe(404);
});

test('new problem, when fields are empty: answers a sentence for each', async () => {
  const petra = await app.signIn('petra');

  const answer = await petra.post(PROBLEMS, { ...CANDLE, number: 0, title: ' ', statement: '' });

  expect(answer.status).toBe(422);
  expect(answer.body.fields).toEqual({
    number: 'Numbers begin at 1.',
    title: 'Give the problem its short name.',
    statement: 'Paste the task as it was set.',
  });
});

test.each(['0', '1.5', '-1', 'one', '9999999999'])(
  'problem, when its number is %s: answers 404',
  async (number) => {
    const petra = await app.signIn('petra');

    const answer = await petra.get(`${PROBLEMS}/${number}`);

    expect(answer.status).toBe(404);
  },
);

test('change a problem, when the settings change: raises the version of the evidence', async () => {
  const ines = await app.signIn('ines');
  const before = (await ines.get(`${SPOUT}/evidence`)).body.evidence;
  const { rowVersion } = (await ines.get(SPOUT)).body;

  const answer = await ines.patch(SPOUT, { settings: { k: 3 } }).set('if-match', String(rowVersion));

  expect(answer.status).toBe(200);
  expect(answer.body.settings.k).toBe(3);
  expect(answer.body.rowVersion).toBe(rowVersion + 1);
  const after = (await ines.get(`${SPOUT}/evidence`)).body.evidence;
  expect(after.version).toBe(before.version + 1);
  expect(after.settings).toEqual({ ...before.settings, k: 3 });
});

test('change a problem, when only the title changes: the evidence keeps its version', async () => {
  const ines = await app.signIn('ines');
  const before = (await ines.get(`${SPOUT}/evidence`)).body.evidence.version;

  const answer = await ines.patch(SPOUT, { title: 'Leaning Can' }).set('if-match', '1');

  expect(answer.status).toBe(200);
  expect(answer.body.title).toBe('Leaning Can');
  expect((await ines.get(`${SPOUT}/evidence`)).body.evidence.version).toBe(before);
});

test('change a problem, when somebody changed it meanwhile: answers 409 and keeps theirs', async () => {
  const ines = await app.signIn('ines');
  const kasimir = await app.signIn('kasimir');
  await kasimir.patch(SPOUT, { title: 'Leaning Can' }).set('if-match', '1');

  const answer = await ines.patch(SPOUT, { title: 'Tilted Can' }).set('if-match', '1');

  expect(answer.status).toBe(409);
  expect(answer.body.code).toBe('changed-meanwhile');
  expect((await ines.get(SPOUT)).body.title).toBe('Leaning Can');
});

test('change a problem, when no version is given: answers 428', async () => {
  const ines = await app.signIn('ines');

  const answer = await ines.patch(SPOUT, { title: 'Leaning Can' });

  expect(answer.status).toBe(428);
  expect(answer.body.code).toBe('needs-version');
});

test('change a problem, when a task is added and another goes: the new one gets its claim, the old claim stays free of it', async () => {
  const petra = await app.signIn('petra');
  await petra.post(PROBLEMS, CANDLE);
  const [kept] = (await petra.get(`${PROBLEMS}/7`)).body.tasks;

  const answer = await petra
    .patch(`${PROBLEMS}/7`, { tasks: [kept, { id: 'task-jar', text: 'How large is the jar?' }] })
    .set('if-match', '1');

  expect(answer.body.tasks).toEqual([kept, { id: 'task-jar', text: 'How large is the jar?' }]);
  const { claims } = (await petra.get(`${PROBLEMS}/7/evidence`)).body.evidence;
  expect(
    claims.map(({ n, text, task }: { n: number; text: string; task?: string }) => [n, text, task ?? null]),
  ).toEqual([
    [1, 'For how long does it burn?', kept.id],
    [2, 'What ends it?', null],
    [3, 'How large is the jar?', 'task-jar'],
  ]);
});
