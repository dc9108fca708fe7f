import { act, cleanup, screen, within } from '@testing-library/react';
import { afterEach, beforeAll, beforeEach, expect, test, vi } from 'vitest';
import type { Quantity, Series, Trial } from '#shared/evidence/evidence.ts';
import { fakeServer, refusal, type FakeServer } from '../support/fake-server.ts';
import { emptyEvidence, problem, session, summary, team, TODAY } from '../support/invented.ts';
import { renderAt } from '../support/render-at.tsx';

const EVIDENCE = 'GET /api/teams/tern-rock/problems/1/evidence';
const SETTINGS = '/team/tern-rock/problem/1/settings';

const RANGE: Quantity = {
  id: 'q-r',
  symbol: 'R',
  name: 'range on the tray',
  unit: 'cm',
  status: 'measured',
  def: { origin: 'recorded', instrument: null },
};
const SERIES: Series = { id: 's-a', letter: 'A', name: 'upright', held: {}, settings: [], readings: ['q-r'] };

function trial(number: number): Trial {
  return {
    id: `t-${number}`,
    number,
    series: 's-a',
    order: number,
    by: 'Ines Farrow',
    at: '2026-03-01T10:00:00Z',
    values: { 'q-r': { text: '30.0', unit: 'cm' } },
  };
}

/** A screen's file is read when it is first opened. */
const ENOUGH = { timeout: 15_000 };

async function stationLine() {
  return within(await screen.findByRole('navigation', { name: 'Stations of this problem' }, ENOUGH));
}

let server: FakeServer;

// Each screen's file is read once, before the clock of the first test runs.
beforeAll(async () => {
  await import('#src/app/frames/problem-frame.tsx');
  await import('#src/app/screens/trials-screen.tsx');
  await import('#src/app/screens/report-screen.tsx');
}, 90_000);

beforeEach(() => {
  vi.useFakeTimers({ now: TODAY, toFake: ['Date'] });
  server = fakeServer();
  server.on('GET /api/session', session());
  server.on('GET /api/teams/tern-rock', team());
  server.on('GET /api/teams/tern-rock/problems', [summary()]);
  server.on('GET /api/teams/tern-rock/problems/1', problem());
  server.on(EVIDENCE, {
    evidence: emptyEvidence({ version: 4, quantities: [RANGE], series: [SERIES], trials: [trial(1)] }),
    rowVersions: {},
  });
});

afterEach(() => {
  cleanup();
  vi.unstubAllGlobals();
  vi.useRealTimers();
  localStorage.clear();
});

test('problem, when it is opened the first time: begins at Trials, with its count in the cup', async () => {
  const { router } = renderAt('/team/tern-rock/problem/1');

  const stations = await stationLine();
  await stations.findByText('1 trial');
  expect(stations.getAllByRole('link').map((link) => link.textContent)).toEqual([
    'Trials1 trial',
    'Model',
    'Report',
    'Leak check',
    'Editions',
  ]);
  expect(stations.getByRole('link', { name: /Trials/ }).getAttribute('aria-current')).toBe('page');
  expect(router.state.location.pathname).toBe('/team/tern-rock/problem/1/trials');
});

test('problem, when it was left at another station: opens there', async () => {
  localStorage.setItem('holdwater:station:tern-rock/1', 'report');
  const { router } = renderAt('/team/tern-rock/problem/1');

  await vi.waitFor(
    () => expect(router.state.location.pathname).toBe('/team/tern-rock/problem/1/report'),
    ENOUGH,
  );
});

test('problem, when somebody else logs a trial: the count follows without asking the server again', async () => {
  renderAt('/team/tern-rock/problem/1/trials');
  const stations = await stationLine();
  await stations.findByText('1 trial');

  act(() =>
    server.sockets.at(-1)?.says({
      type: 'evidence',
      team: 'tern-rock',
      number: 1,
      step: { version: 5, mutationId: 'theirs', changes: [{ table: 'trials', id: 't-2', row: trial(2) }] },
    }),
  );

  expect(await stations.findByText('2 trials')).toBeTruthy();
  expect(server.asked(EVIDENCE)).toHaveLength(1);
});

test('problem, when a step is missing: the evidence is fetched again', async () => {
  renderAt('/team/tern-rock/problem/1/trials');
  const stations = await stationLine();
  await stations.findByText('1 trial');
  server.on(EVIDENCE, {
    evidence: emptyEvidence({
      version: 6,
      quantities: [RANGE],
      series: [SERIES],
      trials: [trial(1), trial(2), trial(3)],
    }),
    rowVersions: {},
  });

  act(() =>
    server.sockets.at(-1)?.says({
      type: 'evidence',
      team: 'tern-rock',
      number: 1,
      step: { version: 6, mutationId: 'theirs', changes: [{ table: 'trials', id: 't-3', row: trial(3) }] },
    }),
  );

  expect(await stations.findByText('3 trials')).toBeTruthy();
});

test('problem, when others have it open: says who is here, and where', async () => {
  renderAt(SETTINGS);
  await screen.findByRole('heading', { name: 'Settings of Leaning Spout' });
  expect(screen.getAllByText('only you are here').length).toBeGreaterThan(0);

  act(() =>
    server.sockets.at(-1)?.says({
      type: 'here',
      team: 'tern-rock',
      number: 1,
      people: [{ name: 'Kasimir Lund', where: 'Comparison' }],
    }),
  );

  expect((await screen.findAllByText('here: Kasimir, in Comparison')).length).toBeGreaterThan(0);
});

test('problem, while it is open: the others are told where this person is', async () => {
  renderAt(SETTINGS);
  await screen.findByRole('heading', { name: 'Settings of Leaning Spout' });

  act(() => server.sockets.at(-1)?.opens());

  expect(server.sockets.at(-1)?.sent).toEqual([
    { type: 'watch', team: 'tern-rock', number: 1, where: 'Settings' },
  ]);
});

test('problem, when a digit is pressed: goes to that station', async () => {
  const { user, router } = renderAt(SETTINGS);
  await screen.findByRole('heading', { name: 'Settings of Leaning Spout' });

  await user.keyboard('0');

  await vi.waitFor(() => expect(router.state.location.pathname).toBe('/team/tern-rock'), ENOUGH);
});

test.each([
  ['a number that is not there', '/team/tern-rock/problem/77/trials'],
  ['no number at all', '/team/tern-rock/problem/one/trials'],
  ['an address of another kind', '/somewhere/else'],
])('problem, with %s: says that there is nothing at this address', async (_, address) => {
  server.on('GET /api/teams/tern-rock/problems/77', () =>
    refusal(404, 'not-found', 'There is nothing here.'),
  );
  server.on('GET /api/teams/tern-rock/problems/77/evidence', () =>
    refusal(404, 'not-found', 'There is nothing here.'),
  );
  renderAt(address);

  expect(await screen.findByRole('heading', { name: 'There is nothing at this address' })).toBeTruthy();
});

test('problem, when its evidence does not come: says so and can be tried again', async () => {
  server.on(EVIDENCE, () => refusal(500, 'failed', 'The server failed. Try again.'));
  const { user } = renderAt(SETTINGS);

  expect((await screen.findByRole('alert')).textContent).toBe('The server failed. Try again.');
  server.on(EVIDENCE, { evidence: emptyEvidence(), rowVersions: {} });
  await user.click(screen.getByRole('button', { name: 'Try again' }));

  expect(await screen.findByRole('heading', { name: 'Settings of Leaning Spout' })).toBeTruthy();
});
