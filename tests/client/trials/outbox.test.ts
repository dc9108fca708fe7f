import { describe, expect, test } from 'vitest';
import { createOutbox, type WaitingTrial } from '#src/features/trials/outbox.ts';

const waiting = (id: string): WaitingTrial => ({ series: 's', trial: { id, values: {} } });

describe('trials that wait to be sent', () => {
  test('when the page is opened again: they are still there', () => {
    createOutbox('key', window.localStorage).add(waiting('a'));

    expect(createOutbox('key', window.localStorage).get()).toEqual([waiting('a')]);
  });

  test('when the same trial is added twice: it waits once', () => {
    const outbox = createOutbox('twice', window.localStorage);

    outbox.add(waiting('a'));
    outbox.add(waiting('a'));

    expect(outbox.get()).toHaveLength(1);
  });

  test('when one has been sent: only that one goes', () => {
    const outbox = createOutbox('sent', window.localStorage);
    outbox.add(waiting('a'));
    outbox.add(waiting('b'));

    outbox.remove('a');

    expect(outbox.get()).toEqual([waiting('b')]);
  });

  test('when what was kept is damaged: it starts empty instead of failing', () => {
    window.localStorage.setItem('damaged', '{');

    expect(createOutbox('damaged', window.localStorage).get()).toEqual([]);
  });
});
