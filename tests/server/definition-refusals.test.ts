/** What is refused of a definition, and with which sentence beside which field. */
import { afterAll, beforeAll, expect, test } from 'vitest';
import { startTestServer } from '#tests/support/server.ts';
import type { SignedIn, TestServer } from '#tests/support/server.ts';
import { makeSmallProblem, newMutation, recorded } from '#tests/support/small-problem.ts';
import type { SmallProblem } from '#tests/support/small-problem.ts';

let app: TestServer;
let ines: SignedIn;
let small: SmallProblem;
beforeAll(async () => {
  app = await startTestServer();
  ines = await app.signIn('ines');
  small = await makeSmallProblem(ines);
});
afterAll(() => app.stop());

const part = { kind: 'offset', amount: '0.05', unit: 'cm', shape: 'rectangular', shared: true };

async function refusedFields(table: string, row: object): Promise<Record<string, string>> {
  const before = (await ines.get(`${small.path}/evidence`)).body.evidence.version;
  const answer = await ines.post(`${small.path}/${table}`, { mutationId: newMutation(), row });
  const after = (await ines.get(`${small.path}/evidence`)).body.evidence.version;
  expect(answer.status).toBe(422);
  expect(answer.body.code).toBe('invalid');
  expect(after).toBe(before);
  return answer.body.fields;
}

test('quantity, when its unit is unknown: is refused beside the unit', async () => {
  const fields = await refusedFields('quantities', recorded('h', 'head', 'furlongish'));

  expect(Object.keys(fields)).toEqual(['row.unit']);
  expect(fields['row.unit']).toMatch(/furlongish/);
});

test('quantity, when its symbol is taken, written in another way: is refused beside the symbol', async () => {
  const fields = await refusedFields('quantities', recorded('theta', 'slope', '°'));

  expect(fields).toEqual({
    'row.symbol': 'θ is “lean of the can” already. Use another letter or a subscript.',
  });
});

test('quantity, when its symbol is a word: is refused beside the symbol', async () => {
  const fields = await refusedFields('quantities', recorded('speed', 'speed', 'm/s'));

  expect(Object.keys(fields)).toEqual(['row.symbol']);
});

test('constant, when its number has both decimal marks: is refused beside the number', async () => {
  const fields = await refusedFields('quantities', {
    ...recorded('L', 'length', 'cm'),
    def: { origin: 'constant', reading: { text: '1,234.5', unit: 'cm' }, parts: [] },
  });

  expect(Object.keys(fields)).toEqual(['row.def.reading.text']);
});

test.each(['0', '-0.1'])(
  'instrument, when a part of its uncertainty is %s: is refused beside the amount',
  async (amount) => {
    const fields = await refusedFields('instruments', { name: 'steel rule', parts: [{ ...part, amount }] });

    expect(fields['row.parts.0.amount']).toBe(
      `An uncertainty must be more than 0, not ${amount}. Remove the line where there is none.`,
    );
  },
);

test('series, when it sets a quantity it also holds: is refused beside the setting', async () => {
  const fields = await refusedFields('series', {
    name: 'lean',
    held: { [small.theta]: { text: '20', unit: '°' } },
    settings: [small.theta],
    readings: [small.range],
  });

  expect(fields).toEqual({ 'row.settings.0': 'This is held fixed or set already. Keep it in one place.' });
});

test('series, when a quantity is not in the register: is refused beside it', async () => {
  const fields = await refusedFields('series', {
    name: 'lean',
    held: {},
    settings: ['q-gone'],
    readings: [],
  });

  expect(fields).toEqual({ 'row.settings.0': 'This quantity is not here any more. Choose another.' });
});

test('model, when its expression cannot be read: is refused beside the expression', async () => {
  const fields = await refusedFields('models', {
    equations: [{ defines: small.range, expr: '2*(θ' }],
    output: small.range,
    limits: [],
    assumptions: [],
  });

  expect(Object.keys(fields)).toEqual(['row.equations.0.expr']);
});

test('model, when it names a symbol that nobody has: is refused beside the expression', async () => {
  const fields = await refusedFields('models', {
    equations: [{ defines: small.range, expr: '2*Q' }],
    output: small.range,
    limits: [],
    assumptions: [],
  });

  expect(fields['row.equations.0.expr']).toMatch(/Q/);
});

test('model, when a limit is upside down: is refused beside its lower end', async () => {
  const fields = await refusedFields('models', {
    equations: [{ defines: small.range, expr: '2 [cm]' }],
    output: small.range,
    limits: [{ quantity: small.theta, min: { text: '60', unit: '°' }, max: { text: '1', unit: 'rad' } }],
    assumptions: [],
  });

  expect(fields).toEqual({
    'row.limits.0.min.text': 'The lower end is above the upper end. Exchange the two.',
  });
});

test('comparison, when its model is gone: is refused beside the model', async () => {
  const fields = await refusedFields('comparisons', {
    name: 'upright',
    model: 'm-gone',
    selection: { series: [small.series], plusTrials: [], where: [] },
    free: [],
    weights: 'absolute',
  });

  expect(fields).toEqual({ 'row.model': 'This model is not here any more. Choose another.' });
});

test('claim, when one side of a difference is gone: is refused beside that side', async () => {
  const gone = { kind: 'quantity', quantity: 'q-gone' };
  const there = { kind: 'quantity', quantity: small.range };

  const fields = await refusedFields('claims', {
    text: 'They agree.',
    test: { kind: 'equals', measured: { kind: 'difference', a: there, b: gone }, expected: there },
  });

  expect(fields).toEqual({
    'row.test.measured.b.quantity': 'This quantity is not here any more. Choose another.',
  });
});

test('chart, when its comparison is gone: is refused beside the comparison', async () => {
  const fields = await refusedFields('charts', { comparison: 'c-gone', x: small.theta, sentence: '' });

  expect(fields).toEqual({ 'row.comparison': 'This comparison is not here any more. Choose another.' });
});

test('two quantities, when each is defined by the other: are stored, for the circle is shown as a fault and nothing is lost', async () => {
  const derived = (symbol: string, expr: string) => ({
    symbol,
    name: symbol,
    unit: '1',
    status: 'measured',
    def: { origin: 'derived', expr },
  });
  const first = await ines.post(`${small.path}/quantities`, {
    mutationId: newMutation(),
    row: derived('P', '1'),
  });
  const second = await ines.post(`${small.path}/quantities`, {
    mutationId: newMutation(),
    row: derived('Q_2', `{${first.body.id}}`),
  });

  const circle = await ines
    .put(`${small.path}/quantities/${first.body.id}`, {
      mutationId: newMutation(),
      row: derived('P', `{${second.body.id}}`),
    })
    .set('if-match', '1');

  expect(circle.status).toBe(200);
});

test('derived quantity, when it is written with symbols: is stored by id', async () => {
  const answer = await ines.post(`${small.path}/quantities`, {
    mutationId: newMutation(),
    row: { ...recorded('S', 'double range', 'cm'), def: { origin: 'derived', expr: '2*R' } },
  });

  expect(answer.status).toBe(201);
  expect(answer.body.changes[0].row.def.expr).toContain(`{${small.range}}`);
});
