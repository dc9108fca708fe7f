/** The leak check as a person reads and answers it; only the network is faked. */
import { cleanup, screen, within } from '@testing-library/react';
import { afterEach, beforeEach, describe, expect, test, vi } from 'vitest';
import { leaningSpoutReport } from '#server/database/seeders/demo/leaning-spout-report.ts';
import { emptyReport } from '#shared/report/schema/empty-report.ts';
import type { LeaksState } from '#shared/contracts/leaks.ts';
import type { Role } from '#shared/contracts/session.ts';
import { json, refusal, type FakeServer } from '#tests/client/support/fake-server.ts';
import { API, ENOUGH, PROBLEM, spoutEvidence, spoutServer } from '#tests/client/support/leaning-spout.ts';
import { renderAt } from '#tests/client/support/render-at.tsx';

const MARK = {
  leak: 'trust:c-plain',
  name: 'Outside trust',
  section: 'Model',
  question: 'Does the law survive the last 2 cm?',
  evidence: 'A11 and A12 are not compared.',
} as const;

let server: FakeServer;
beforeEach(() => localStorage.clear());
afterEach(() => {
  cleanup();
  vi.unstubAllGlobals();
});

function open(kept: Partial<LeaksState> = {}, role: Role = 'member') {
  const evidence = spoutEvidence();
  server = spoutServer(evidence, role);
  server.on(`GET ${API}/report`, {
    schemaVersion: 1,
    lineage: 'l',
    document: leaningSpoutReport(evidence),
  });
  server.on(`GET ${API}/leaks`, { leaks: [], answers: [], marks: [MARK], ...kept });
  return renderAt(`${PROBLEM}/leaks`);
}

async function question(name: RegExp): Promise<HTMLElement> {
  const button = await screen.findByRole('button', { name }, ENOUGH);
  const item = button.closest('li');
  if (!item) throw new Error('question: stands outside the list');
  return item;
}

describe('leak check', () => {
  test('of the demonstration: the list is the hardest first, whatever its place on the vessel', async () => {
    open();
    await question(/^Your model overshoots/);

    const list = screen.getByRole('list', { name: /hardest first/ });
    const questions = within(list)
      .getAllByRole('listitem')
      .map((item) => within(item).getAllByRole('button')[0]?.textContent ?? '');

    expect(questions[0]).toMatch(/^Your model overshoots/);
    expect(questions[1]).toMatch(/^You claim/);
    expect(questions.at(-1)).toBe(MARK.question);
    expect(screen.getByText(/Nine leaks are open and one is mended\./)).toBeTruthy();
  });

  test('when a question is pressed: it comes forward and says what would mend it', async () => {
    const { user } = open();
    const item = await question(/^You name surface tension/);

    await user.click(within(item).getByRole('button', { name: /^You name surface tension/ }));

    expect(within(item).getByText('To mend it:')).toBeTruthy();
    expect(within(item).getByRole('button', { pressed: true })).toBeTruthy();
  });

  test('when it is answered: what is sent names the answer that was seen', async () => {
    const { user } = open();
    server.on(`PUT ${API}/leaks/named%3Aq-sigma/answer`, { answer: null });
    const item = await question(/^You name surface tension/);

    await user.click(within(item).getByRole('button', { name: /^Answer/ }));
    await user.type(within(item).getByRole('textbox'), 'We took 72 mN/m.');
    await user.click(within(item).getByRole('button', { name: 'Keep the answer' }));

    await vi.waitFor(() =>
      expect(server.asked(`PUT ${API}/leaks/named%3Aq-sigma/answer`)[0]?.body).toEqual({
        text: 'We took 72 mN/m.',
        after: null,
      }),
    );
  });

  test('when somebody else answered meanwhile: says so, and keeps what was typed', async () => {
    const { user } = open();
    server.on(`PUT ${API}/leaks/named%3Aq-sigma/answer`, () =>
      refusal(409, 'changed-meanwhile', 'Somebody changed this since you opened it.'),
    );
    const item = await question(/^You name surface tension/);
    await user.click(within(item).getByRole('button', { name: /^Answer/ }));
    await user.type(within(item).getByRole('textbox'), 'We took 72 mN/m.');

    await user.click(within(item).getByRole('button', { name: 'Keep the answer' }));

    expect(await within(item).findByText(/Somebody changed this/)).toBeTruthy();
    expect(within(item).getByRole<HTMLTextAreaElement>('textbox').value).toBe('We took 72 mN/m.');
  });

  test('when the numbers moved since the answer: asks to look again', async () => {
    open({
      answers: [
        {
          leak: 'excluded:trial-b11',
          text: 'It slid.',
          by: 'Kasimir Lund',
          at: '2026-03-01T12:00:00Z',
          basis: 'old',
        },
      ],
    });

    const item = await question(/^Why is B11 missing/);

    expect(within(item).getByText('Look again: the numbers have moved since.')).toBeTruthy();
    expect(within(item).getByRole('button', { name: /^Change answer/ })).toBeTruthy();
  });

  test('as an advisor: everything is read, and nothing can be answered', async () => {
    open({}, 'advisor');
    await question(/^You name surface tension/);

    expect(screen.queryAllByRole('button', { name: /^Answer/ })).toEqual([]);
  });

  test('when nothing is written yet: says what that means', async () => {
    const evidence = {
      ...spoutEvidence(),
      quantities: [],
      series: [],
      trials: [],
      models: [],
      comparisons: [],
      claims: [],
      charts: [],
    };
    server = spoutServer(evidence);
    server.on(`GET ${API}/report`, { schemaVersion: 1, lineage: 'l', document: emptyReport() });
    server.on(`GET ${API}/leaks`, { leaks: [], answers: [], marks: [] });
    renderAt(`${PROBLEM}/leaks`);

    expect(await screen.findByText(/That is not the same as being right/, {}, ENOUGH)).toBeTruthy();
  });

  test('when the server does not answer: says so, and trying again brings them', async () => {
    const { user } = open();
    server.on(`GET ${API}/leaks`, () => refusal(500, 'internal', 'Something went wrong here. Try again.'));
    const again = await screen.findByRole('button', { name: 'Try again' }, ENOUGH);

    server.on(`GET ${API}/leaks`, () => json({ leaks: [], answers: [], marks: [MARK] }));
    await user.click(again);

    expect(await question(/^Your model overshoots/)).toBeTruthy();
  });
});
