/** Margin notes over HTTP: who writes, answers, settles and places, and what each is told when they may not. */
import { afterEach, beforeEach, describe, expect, test } from 'vitest';
import type { MarginNote } from '#shared/contracts/notes.ts';
import {
  SPOUT,
  startTestServer,
  type DemoName,
  type SignedIn,
  type TestServer,
} from '#tests/support/server.ts';

const NOTES = `${SPOUT}/notes`;
const PLACE = { from: 'AAEC', to: 'AAED', before: 'where the ', after: ' breaks' };
const NEW = {
  id: 'note-of-the-test',
  section: 'Comparison',
  anchor: { kind: 'text', ...PLACE, quote: 'jet', said: 'jet' },
  text: 'Which jet?',
};

let app: TestServer;
let people: Readonly<Record<'odile' | 'kasimir' | 'ines', SignedIn>>;
beforeEach(async () => {
  app = await startTestServer();
  const [odile, kasimir, ines] = await Promise.all(
    (['odile', 'kasimir', 'ines'] as DemoName[]).map(app.signIn),
  );
  if (!odile || !kasimir || !ines) throw new Error('nobody is signed in');
  people = { odile, kasimir, ines };
});
afterEach(() => app.stop());

async function notes(): Promise<MarginNote[]> {
  return (await people.kasimir.get(NOTES)).body as MarginNote[];
}

async function written(): Promise<MarginNote> {
  const answer = await people.odile.post(NOTES, NEW);
  expect(answer.status, answer.text).toBe(201);
  return answer.body as MarginNote;
}

const codeOf = (answer: { body: unknown }) => (answer.body as { code: string }).code;

describe('margin notes', () => {
  test('of the demonstration: there is one in each state, by the advisor, with the answers of the team', async () => {
    const all = await notes();

    expect(all.map(({ n, state }) => [n, state])).toEqual([
      [1, 'agreed'],
      [2, 'held to'],
      [3, 'answered'],
      [4, 'open'],
    ]);
    expect(new Set(all.map(({ by }) => by))).toEqual(new Set(['Odile Marsk']));
    expect(all[1]?.settled).toMatchObject({ by: 'Ines Farrow', reason: expect.stringMatching(/small hole/) });
    expect(all[2]?.answers[0]?.by).toBe('Kasimir Lund');
  });

  test('when the advisor writes one: it has the next number, and sent twice it is one', async () => {
    expect(await written()).toMatchObject({
      n: 5,
      by: 'Odile Marsk',
      state: 'open',
      revision: 0,
      answers: [],
    });
    await written();

    expect(await notes()).toHaveLength(5);
  });

  test('when it holds markup: the text is kept and given as it was typed', async () => {
    const text = '<img src=x onerror="alert(1)"><script>alert(2)</script> & so on';
    const answer = await people.odile.post(NOTES, { ...NEW, text });

    expect((answer.body as MarginNote).text).toBe(text);
    expect(answer.headers['content-type']).toMatch(/^application\/json/);
  });

  test('when a note is empty, too long, or placed nowhere: is refused with its field', async () => {
    expect((await people.odile.post(NOTES, { ...NEW, text: '   ' })).status).toBe(422);
    expect((await people.odile.post(NOTES, { ...NEW, text: 'a'.repeat(1001) })).status).toBe(422);
    expect((await people.odile.post(NOTES, { ...NEW, section: 'Appendix' })).status).toBe(422);
    const anchor = { ...NEW.anchor, from: '<b>' };
    expect((await people.odile.post(NOTES, { ...NEW, anchor })).status).toBe(422);
  });

  test('when an id is somebody else’s: is refused, and the note there stays', async () => {
    const answer = await people.odile.post(`${SPOUT.replace(/1$/, '12')}/notes`, {
      ...NEW,
      id: 'demo-note-1',
    });

    expect(answer.status).toBe(409);
    expect(codeOf(answer)).toBe('id-taken');
    expect((await notes())[0]?.text).not.toBe(NEW.text);
  });

  test('when captain or member write one, or the advisor answers: is refused', async () => {
    expect((await people.ines.post(NOTES, NEW)).status).toBe(403);
    expect((await people.kasimir.post(NOTES, NEW)).status).toBe(403);
    const reply = { id: 'reply-of-the-test', text: 'So.' };
    expect((await people.odile.post(`${NOTES}/demo-note-4/answers`, reply)).status).toBe(403);
  });

  test('when a member answers: the note is answered, and the answer sent twice is one', async () => {
    const { id } = await written();
    const reply = { id: 'reply-of-the-test', text: 'The one at 38°.' };
    await people.kasimir.post(`${NOTES}/${id}/answers`, reply);
    const again = await people.kasimir.post(`${NOTES}/${id}/answers`, reply);

    expect(again.body).toMatchObject({
      state: 'answered',
      answers: [{ text: reply.text, by: 'Kasimir Lund' }],
    });
    expect((again.body as MarginNote).answers).toHaveLength(1);
  });

  test('when the advisor agrees: it is settled, nobody answers it any more, and it is settled once', async () => {
    const { id } = await written();
    const settled = await people.odile.patch(`${NOTES}/${id}`, { kind: 'agree' });

    expect(settled.body).toMatchObject({ state: 'agreed', settled: { by: 'Odile Marsk', reason: '' } });
    const late = await people.kasimir.post(`${NOTES}/${id}/answers`, { id: 'reply-late', text: 'But' });
    expect([late.status, codeOf(late)]).toEqual([409, 'settled']);
    const second = await people.ines.patch(`${NOTES}/${id}`, { kind: 'hold to', reason: 'Because.' });
    expect([second.status, codeOf(second)]).toEqual([409, 'settled']);
  });

  test('when the captain holds to the text: the reason is needed, and is kept', async () => {
    const { id } = await written();

    expect((await people.ines.patch(`${NOTES}/${id}`, { kind: 'hold to', reason: ' ' })).status).toBe(422);
    const held = await people.ines.patch(`${NOTES}/${id}`, { kind: 'hold to', reason: 'The task says so.' });
    expect(held.body).toMatchObject({ state: 'held to', settled: { reason: 'The task says so.' } });
  });

  test('when a member settles: is refused', async () => {
    expect((await people.kasimir.patch(`${NOTES}/demo-note-4`, { kind: 'agree' })).status).toBe(403);
    expect((await people.kasimir.patch(`${NOTES}/demo-note-1`, { kind: 'open again' })).status).toBe(403);
  });

  test('when a settled note is opened again: it is answered if it has answers, and nothing says it was settled', async () => {
    const again = await people.odile.patch(`${NOTES}/demo-note-2`, { kind: 'open again' });

    expect(again.body).toMatchObject({ state: 'answered', settled: null });
  });

  test('when two editors place a note at once: the second is told, and what is quoted never changes', async () => {
    const { id } = await written();
    const change = { kind: 'place', place: { ...PLACE, before: 'that the ' }, revision: 0 };
    const first = await people.kasimir.patch(`${NOTES}/${id}`, { ...change, quote: 'another' });
    const second = await people.ines.patch(`${NOTES}/${id}`, change);

    expect(first.body).toMatchObject({ revision: 1, anchor: { quote: 'jet', before: 'that the ' } });
    expect([second.status, codeOf(second)]).toEqual([409, 'changed-meanwhile']);
    expect((await people.odile.patch(`${NOTES}/${id}`, { ...change, revision: 1 })).status).toBe(403);
  });

  test('when a note of another problem is named: there is none', async () => {
    const other = `${SPOUT.replace(/1$/, '12')}/notes/demo-note-4`;

    expect((await people.odile.patch(other, { kind: 'agree' })).status).toBe(404);
    expect(
      (await people.kasimir.post(`${other}/answers`, { id: 'reply-elsewhere', text: 'So.' })).status,
    ).toBe(404);
  });

  test('whatever is written beside it: the report stays as it was', async () => {
    const before = (await people.kasimir.get(`${SPOUT}/report`)).body as unknown;
    const { id } = await written();
    await people.kasimir.post(`${NOTES}/${id}/answers`, { id: 'reply-of-the-test', text: 'So.' });
    await people.odile.patch(`${NOTES}/${id}`, { kind: 'agree' });

    expect((await people.kasimir.get(`${SPOUT}/report`)).body).toEqual(before);
  });
});
