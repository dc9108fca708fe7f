/** The claim sheet of the invented Leaning Spout. */
import { cleanup, screen, within } from '@testing-library/react';
import { afterEach, beforeAll, beforeEach, expect, test, vi } from 'vitest';
import { json, type FakeServer } from '../support/fake-server.ts';
import { TODAY } from '../support/invented.ts';
import { API, ENOUGH, PROBLEM, spoutEvidence, spoutServer } from '../support/leaning-spout.ts';
import { renderAt, valueOf } from '../support/render-at.tsx';

const plain = (text: string | null | undefined) => (text ?? '').replaceAll('\u00a0', ' ');
let server: FakeServer;

beforeAll(async () => {
  await import('#src/app/frames/problem-frame.tsx');
  await import('#src/app/screens/claims-screen.tsx');
}, 90_000);
beforeEach(() => {
  vi.useFakeTimers({ now: TODAY, toFake: ['Date'] });
  server = spoutServer();
});
afterEach(() => {
  cleanup();
  vi.unstubAllGlobals();
  vi.useRealTimers();
  localStorage.clear();
});

async function open(): Promise<ReturnType<typeof renderAt>> {
  const view = renderAt(`${PROBLEM}/model/claims`);
  await screen.findByRole('heading', { name: 'Claims' }, ENOUGH);
  return view;
}

const claim = (n: number) => {
  const row = document.getElementById(`claim-${n}`);
  if (!row) throw new Error(`no claim ${n}`);
  return row;
};

test('the sheet: counts the verdicts in words, and each claim says what would turn it where one value decides', async () => {
  await open();

  expect(plain(screen.getByRole('main').textContent)).toContain('Two hold, one leaks and one is undecided.');
  expect(plain(claim(1).textContent)).toMatch(/Holds$/);
  expect(plain(claim(3).textContent)).toMatch(/differ by 2\.3 u; this claim holds at 2 u or less\./);
  expect(plain(claim(3).textContent)).toMatch(/It would hold if the measured value rose to 46\.\d cm\./);
  expect(plain(claim(3).textContent)).toMatch(/Leaks$/);
  expect(plain(claim(4).textContent)).toContain('No test is chosen yet.');
  expect(claim(1).textContent).not.toContain('It would');
});

test('a claim, when it is changed: opens in place with what it says, and Leave it closes it', async () => {
  const { user } = await open();
  await user.click(screen.getByRole('button', { name: 'Change claim 3' }));
  const form = within(screen.getByRole('form', { name: 'Change claim 3' }));

  expect(valueOf(form.getByLabelText('We claim that'))).toBe(
    'At a head of 20 cm the largest range is 47.9 cm.',
  );
  expect(valueOf(form.getByLabelText('Decided by'))).toBe('equals');
  await user.click(form.getByRole('button', { name: 'Leave it' }));

  expect(screen.queryByRole('form', { name: 'Change claim 3' })).toBeNull();
});

test('a new claim without a sentence: is not sent; with one and no test, it stands undecided with its reason', async () => {
  server.on(`POST ${API}/claims`, ({ body }) =>
    json(
      {
        version: spoutEvidence().version + 1,
        mutationId: (body as { mutationId: string }).mutationId,
        changes: [],
        id: 'claim-5',
        rowVersion: 1,
      },
      201,
    ),
  );
  const { user } = await open();
  await user.click(screen.getByRole('button', { name: 'New claim' }));
  const form = within(screen.getByRole('form', { name: 'New claim' }));
  await user.click(form.getByRole('button', { name: 'Add claim' }));
  expect(await form.findByRole('alert')).toBeTruthy();
  expect(server.asked(`POST ${API}/claims`)).toHaveLength(0);

  await user.type(form.getByLabelText('We claim that'), 'Swirl shortens the jet.');
  await user.type(form.getByLabelText('Open because'), 'no swirl was measured');
  await user.click(form.getByRole('button', { name: 'Add claim' }));

  await vi.waitFor(() => expect(server.asked(`POST ${API}/claims`)).toHaveLength(1));
  expect(server.asked(`POST ${API}/claims`)[0]?.body).toMatchObject({
    row: { text: 'Swirl shortens the jet.', test: null, openBecause: 'no swirl was measured' },
  });
});

test('seen by an advisor: nothing can be changed', async () => {
  server = spoutServer(spoutEvidence(), 'advisor');
  await open();

  expect(screen.queryByRole('button', { name: /Change|New claim/ })).toBeNull();
});
