import { afterAll, beforeAll, expect, test } from 'vitest';
import { startTestServer } from '#tests/support/server.ts';
import type { SignedIn, TestServer } from '#tests/support/server.ts';
import { add, makeSmallProblem, newMutation, recorded } from '#tests/support/small-problem.ts';
import type { SmallProblem } from '#tests/support/small-problem.ts';

let app: TestServer;
let kasimir: SignedIn;
let small: SmallProblem;
let width: string;
beforeAll(async () => {
  app = await startTestServer();
  kasimir = await app.signIn('kasimir');
  small = await makeSmallProblem(kasimir);
  width = await add(kasimir, `${small.path}/quantities`, {
    ...recorded('L', 'width of the tray', 'cm'),
    def: { origin: 'constant', reading: { text: '41.0', unit: 'cm', u: '0.2' }, parts: [] },
  });
});
afterAll(() => app.stop());

const getFindings = async () => (await kasimir.get(`${small.path}/findings`)).body;

test('findings, when asked for: are those of the evidence as it stands, in SI', async () => {
  const { evidence } = (await kasimir.get(`${small.path}/evidence`)).body;

  const findings = await getFindings();

  expect(findings.version).toBe(evidence.version);
  expect(findings.values[width]).toMatchObject({ shape: 'scalar', unit: 'cm' });
  expect(findings.values[width].value).toAgreeTo(0.41, { digits: 14 });
  expect(findings.values[width].u).toAgreeTo(0.002, { digits: 12 });
});

test('findings, when a trial is logged: follow it', async () => {
  const before = await getFindings();

  const step = await kasimir.post(`${small.path}/series/${small.series}/trials`, {
    mutationId: newMutation(),
    trials: [
      {
        id: 't-1',
        values: { [small.theta]: { text: '10', unit: '°' }, [small.range]: { text: '36.4', unit: 'cm' } },
      },
    ],
  });

  const after = await getFindings();
  expect(after.version).toBe(step.body.version);
  expect(after.groups[small.series]).toHaveLength(1);
  expect(before.groups[small.series] ?? []).toHaveLength(0);
});

test('findings, when two quantities are defined by each other: tell the circle as a fault, and all else still has its value', async () => {
  const derived = (symbol: string, expr: string) => ({
    ...recorded(symbol, symbol, '1'),
    def: { origin: 'derived', expr },
  });
  const first = await add(kasimir, `${small.path}/quantities`, derived('P', '1'));
  const second = await add(kasimir, `${small.path}/quantities`, derived('Q', `{${first}}`));
  await kasimir
    .put(`${small.path}/quantities/${first}`, { mutationId: newMutation(), row: derived('P', `{${second}}`) })
    .set('if-match', '1');

  const { values } = await getFindings();

  expect(values[first]).toMatchObject({ shape: 'fault', code: 'cycle' });
  expect(values[second]).toMatchObject({ shape: 'fault', code: 'cycle' });
  expect(values[width]).toMatchObject({ shape: 'scalar' });
});
