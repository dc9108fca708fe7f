/** Leaks over HTTP: who reads, who answers, when an answer is to be looked at again, what is mended. */
import { afterEach, beforeEach, describe, expect, test } from 'vitest';
import type { LeaksState } from '#shared/contracts/leaks.ts';
import { SPOUT, startTestServer, type SignedIn, type TestServer } from '#tests/support/server.ts';

const LEAKS = `${SPOUT}/leaks`;
const NAMED = encodeURIComponent('named:q-sigma');

let app: TestServer;
let kasimir: SignedIn;
beforeEach(async () => {
  app = await startTestServer();
  kasimir = await app.signIn('kasimir');
});
afterEach(() => app.stop());

async function leaksOf(person: SignedIn): Promise<LeaksState> {
  const answer = await person.get(LEAKS);
  expect(answer.status).toBe(200);
  return answer.body as LeaksState;
}

describe('leaks', () => {
  test('of the demonstration: are found with their numbers, two of them answered, one mended', async () => {
    const { leaks, answers, marks } = await leaksOf(kasimir);

    expect(leaks[0]).toMatchObject({ name: 'Left unexplained', force: 'burst', section: 'Comparison' });
    expect(leaks[0]?.evidence).toBe('The residuals at 38°, 45° and 55° are −2.3, −3.1 and −3.5\u00a0u.');
    expect(answers.map(({ leak }) => leak)).toEqual(['condition:model-3:swirl', 'excluded:trial-b11']);
    const found = new Set(leaks.map(({ id }) => id));
    expect(marks.filter(({ leak }) => !found.has(leak)).map(({ leak }) => leak)).toEqual(['trust:c-plain']);
  });

  test('when they are read: carry no pressure and no rule codes but the identity', async () => {
    const { leaks } = await leaksOf(kasimir);

    expect(Object.keys(leaks[0] ?? {}).sort()).toEqual(
      ['id', 'name', 'force', 'section', 'question', 'evidence', 'mend'].sort(),
    );
  });

  test('when one is answered: the answer is kept with its author and what it rested on', async () => {
    const put = await kasimir.put(`${LEAKS}/${NAMED}/answer`, { text: ' We took 72 mN/m. ', after: null });

    expect(put.status).toBe(200);
    const { answers } = await leaksOf(await app.signIn('odile'));
    expect(answers.find(({ leak }) => leak === 'named:q-sigma')).toMatchObject({
      text: 'We took 72 mN/m.',
      by: 'Kasimir Lund',
    });
  });

  test('when two people answer the same: the second is told, and the first answer stays', async () => {
    await kasimir.put(`${LEAKS}/${NAMED}/answer`, { text: 'First.', after: null });

    const second = await (
      await app.signIn('maren')
    ).put(`${LEAKS}/${NAMED}/answer`, { text: 'Second.', after: null });

    expect(second.status).toBe(409);
    expect((second.body as { code: string }).code).toBe('changed-meanwhile');
    const { answers } = await leaksOf(kasimir);
    expect(answers.find(({ leak }) => leak === 'named:q-sigma')?.text).toBe('First.');
  });

  test('when an answer is taken away: it is gone', async () => {
    const put = await kasimir.put(`${LEAKS}/${NAMED}/answer`, { text: 'First.', after: null });
    const { answer } = put.body as { answer: { at: string } };

    expect((await kasimir.put(`${LEAKS}/${NAMED}/answer`, { text: '', after: answer.at })).status).toBe(200);

    expect((await leaksOf(kasimir)).answers.some(({ leak }) => leak === 'named:q-sigma')).toBe(false);
  });

  test('when the answer is longer than can be said, or the leak is none: is refused', async () => {
    expect(
      (await kasimir.put(`${LEAKS}/${NAMED}/answer`, { text: 'a'.repeat(601), after: null })).status,
    ).toBe(422);
    expect((await kasimir.put(`${LEAKS}/nothing/answer`, { text: 'So.', after: null })).status).toBe(404);
  });

  test('when a trial is brought back: its leak is found no more, and its last question is kept', async () => {
    await leaksOf(kasimir);

    const back = await kasimir.patch(`${SPOUT}/trials/trial-b11`, {
      mutationId: 'bring-b11-back',
      change: { kind: 'bring back' },
    });

    expect(back.status, back.text).toBe(200);
    const { leaks, marks } = await leaksOf(kasimir);
    expect(leaks.some(({ id }) => id === 'excluded:trial-b11')).toBe(false);
    expect(marks.find(({ leak }) => leak === 'excluded:trial-b11')?.question).toBe(
      'Why is B11 missing from your mean?',
    );
  });
});
