/** A margin note as each of the team sees it; only the network is faked. */
import { cleanup, screen, within } from '@testing-library/react';
import { afterEach, beforeAll, beforeEach, describe, expect, test, vi } from 'vitest';
import type { MarginNote } from '#shared/contracts/notes.ts';
import type { Role } from '#shared/contracts/session.ts';
import { NoteLines } from '#src/features/notes/components/note-lines.tsx';
import type { FindingsStore } from '#src/lib/findings/findings-store.ts';
import { refusal, type FakeServer } from '../support/fake-server.ts';
import { API, spoutEvidence, spoutServer } from '../support/leaning-spout.ts';
import { evaluated, renderInProblem } from '../support/render-in-problem.tsx';

const NOTE: MarginNote = {
  id: 'note-of-the-test',
  n: 3,
  section: 'Comparison',
  anchor: {
    kind: 'text',
    from: 'AA',
    to: 'AB',
    before: '',
    after: '',
    quote: 'the broken jet',
    said: 'the broken jet',
  },
  text: 'Where does it break? <img src=x onerror=alert(1)>',
  by: 'Odile Marsk',
  at: '2026-03-01T14:20:00',
  state: 'open',
  settled: null,
  revision: 0,
  answers: [],
};

let store: FindingsStore;
let server: FakeServer;
beforeAll(async () => {
  store = await evaluated(spoutEvidence());
});
beforeEach(() => {
  server = spoutServer();
});
afterEach(() => {
  cleanup();
  vi.unstubAllGlobals();
});

function show(role: Role, changes: Partial<MarginNote> = {}, isGone = false) {
  const note = { ...NOTE, ...changes };
  return renderInProblem(<NoteLines note={note} isGone={isGone} />, store, {
    role,
    mayWrite: role !== 'advisor',
  });
}

const words = () =>
  within(screen.getByRole('article'))
    .queryAllByRole('button')
    .map((word) => word.getAttribute('aria-label'));

describe('a margin note', () => {
  test.each([
    ['captain', ['Answer note 3', 'Settle note 3']],
    ['member', ['Answer note 3']],
    ['advisor', ['Settle note 3']],
  ] as const)('when it is open, for a %s: offers %s', (role, expected) => {
    show(role);

    expect(words()).toEqual(expected);
  });

  test('with markup in it: shows the markup as text, and makes no element of it', () => {
    const { container } = show('member');

    expect(screen.getByText(/<img src=x onerror=alert\(1\)>/)).toBeTruthy();
    expect(container.querySelector('img')).toBeNull();
  });

  test('when it is held to: says the reason, offers a member nothing, and the captain to open it again', () => {
    const settled = { by: 'Ines Farrow', at: NOTE.at, reason: 'The task says so.' };
    show('member', { state: 'held to', settled });
    expect(screen.getByText(/The task says so\./).textContent).toMatch(
      /^– Held to: The task says so\. I\. Farrow, /,
    );
    expect(words()).toEqual([]);
    cleanup();

    show('captain', { state: 'held to', settled });
    expect(words()).toEqual(['Open again note 3']);
  });

  test('when its words are gone: says so with the words', () => {
    show('member', {}, true);

    expect(
      screen.getByText('What this was about is not in the text any more: “the broken jet”.'),
    ).toBeTruthy();
  });

  test('when it is held to without a reason: cannot be sent; with one, the reason is what is sent', async () => {
    server.on(`PATCH ${API}/notes/${NOTE.id}`, NOTE);
    const { user } = show('captain');
    await user.click(screen.getByRole('button', { name: 'Settle note 3' }));
    await user.click(screen.getByRole('radio', { name: 'Held to' }));
    expect(screen.getByRole<HTMLButtonElement>('button', { name: 'Settle note' }).disabled).toBe(true);

    await user.type(screen.getByLabelText('The reason'), ' It is asked. ');
    await user.click(screen.getByRole('button', { name: 'Settle note' }));

    await vi.waitFor(() =>
      expect(server.asked(`PATCH ${API}/notes/${NOTE.id}`)[0]?.body).toEqual({
        kind: 'hold to',
        reason: 'It is asked.',
      }),
    );
  });

  test('when an answer is refused: says why beside it, and keeps what was typed', async () => {
    server.on(`POST ${API}/notes/${NOTE.id}/answers`, () =>
      refusal(409, 'settled', 'Note 3 was settled meanwhile.'),
    );
    const { user } = show('member');
    await user.click(screen.getByRole('button', { name: 'Answer note 3' }));
    await user.type(screen.getByLabelText('Our answer to note 3'), 'At 25 cm.');
    await user.click(screen.getByRole('button', { name: 'Answer note' }));

    expect((await screen.findByRole('alert')).textContent).toContain('Note 3 was settled meanwhile.');
    expect(screen.getByLabelText<HTMLTextAreaElement>('Our answer to note 3').value).toBe('At 25 cm.');
  });

  test('when Escape is pressed while answering: the words are back, and the first has the focus', async () => {
    const { user } = show('member');
    await user.click(screen.getByRole('button', { name: 'Answer note 3' }));

    await user.keyboard('{Escape}');

    await vi.waitFor(() => expect(document.activeElement?.getAttribute('aria-label')).toBe('Answer note 3'));
  });
});
