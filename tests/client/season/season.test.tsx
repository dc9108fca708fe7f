import { cleanup, screen, within } from '@testing-library/react';
import { afterEach, beforeEach, expect, test, vi } from 'vitest';
import { fakeServer, json, refusal, type FakeServer } from '../support/fake-server.ts';
import { session, summary, team, TODAY } from '../support/invented.ts';
import { renderAt } from '../support/render-at.tsx';

let server: FakeServer;

beforeEach(() => {
  vi.useFakeTimers({ now: TODAY, toFake: ['Date'] });
  server = fakeServer();
  server.on('GET /api/session', session());
  server.on('GET /api/teams/tern-rock', team());
  server.on('GET /api/teams/tern-rock/problems', [
    summary(),
    summary({ number: 6, title: 'Braked Magnet', stage: 'oppose', owners: [], notTied: 0 }),
  ]);
});

afterEach(() => {
  cleanup();
  vi.unstubAllGlobals();
  vi.useRealTimers();
  localStorage.clear();
});

test('season, when a fight is to come: says in how many days and what we do in it, what we report first', async () => {
  renderAt('/team/tern-rock');

  expect(await screen.findByRole('heading', { name: 'Fight 2 is in 11 days' })).toBeTruthy();
  expect(document.body.textContent).toContain(
    'Saturday 14 March, 09:30. We report Leaning Spout to Gannet Bank and oppose Braked Magnet.',
  );
});

test('season, when things wait for this person: each is a link in its own words', async () => {
  renderAt('/team/tern-rock');

  const tie = await screen.findByRole('link', { name: 'two numbers' });
  expect(tie.getAttribute('href')).toBe('/team/tern-rock/problem/1/report');
  expect(screen.getByRole('link', { name: 'one claim' }).getAttribute('href')).toBe(
    '/team/tern-rock/problem/1/model/claims',
  );
  expect(document.body.textContent).toContain(
    'Waiting for you: two numbers in Leaning Spout are not tied, and one claim in Leaning Spout leaks.',
  );
});

test('season, when a problem is listed: its sections have their levels and its claims their verdicts in words', async () => {
  renderAt('/team/tern-rock');

  const row = within(
    (await screen.findByRole('link', { name: 'Leaning Spout' })).closest('li') as HTMLElement,
  );
  expect(row.getAllByRole('listitem').map((item) => item.textContent)).toEqual([
    'PhenomenonHeld',
    'ModelTied',
    'ExperimentHeld',
    'ComparisonDrafted',
    'ConclusionSketched',
  ]);
  expect(row.getByText('hold,')).toBeTruthy();
  expect(row.getByText('we report')).toBeTruthy();
});

test('season, when the channel cannot be seen: one sentence tells it', async () => {
  renderAt('/team/tern-rock');

  expect(
    await screen.findByRole('img', {
      name: 'Season from January to May; today is 3 March. Fight 2 on 14 March is next.',
    }),
  ).toBeTruthy();
});

test('season, when the team is invented: it is said', async () => {
  renderAt('/team/tern-rock');

  expect(await screen.findByText(/invented for demonstration/)).toBeTruthy();
});

test('season, when there is no problem yet: the first row shows the first step', async () => {
  server.on('GET /api/teams/tern-rock/problems', []);
  renderAt('/team/tern-rock');

  expect(await screen.findByText(/the short name of a problem/)).toBeTruthy();
  expect(screen.getByRole('link', { name: 'New problem' })).toBeTruthy();
});

test('season, when the last fight is over: says so', async () => {
  server.on('GET /api/teams/tern-rock', team({ fights: team().fights.slice(0, 1) }));
  renderAt('/team/tern-rock');

  expect(await screen.findByRole('heading', { name: 'The last fight is over' })).toBeTruthy();
});

test('season, when the problems do not come: says so in their place and can be tried again', async () => {
  server.on('GET /api/teams/tern-rock/problems', () =>
    refusal(500, 'failed', 'The server failed. Try again.'),
  );
  const { user } = renderAt('/team/tern-rock');

  const notice = within(await screen.findByRole('alert'));
  server.on('GET /api/teams/tern-rock/problems', [summary()]);
  await user.click(notice.getByRole('button', { name: 'Try again' }));

  expect(await screen.findByRole('link', { name: 'Leaning Spout' })).toBeTruthy();
  expect(screen.queryByRole('alert')).toBeNull();
});

test('season, while the problems are on their way: says what is being brought', async () => {
  let arrive: (answer: Response) => void = () => undefined;
  server.on(
    'GET /api/teams/tern-rock/problems',
    () => new Promise<Response>((resolve) => (arrive = resolve)),
  );
  renderAt('/team/tern-rock');

  expect(await screen.findByText('Bringing the Season')).toBeTruthy();
  arrive(json([summary()]));

  expect(await screen.findByRole('link', { name: 'Leaning Spout' })).toBeTruthy();
});

test('season, when an advisor reads it: nothing can be begun, and nothing is said to wait', async () => {
  server.on('GET /api/session', session('advisor'));
  renderAt('/team/tern-rock');

  expect(await screen.findByRole('link', { name: 'Leaning Spout' })).toBeTruthy();
  expect(screen.queryByRole('link', { name: 'New problem' })).toBeNull();
  expect(document.body.textContent).not.toContain('Waiting for you');
});

test('season, when the team is not theirs: there is nothing at the address', async () => {
  server.on('GET /api/teams/gannet-bank', () => refusal(404, 'not-found', 'There is nothing here.'));
  renderAt('/team/gannet-bank');

  expect(await screen.findByRole('heading', { name: 'There is nothing at this address' })).toBeTruthy();
});

test('season, when the server cannot be reached: says so and can be tried again', async () => {
  server.on('GET /api/teams/tern-rock', () => Promise.reject(new TypeError('Failed to fetch')));
  const { user } = renderAt('/team/tern-rock');

  expect(await screen.findByRole('heading', { name: 'The server cannot be reached' })).toBeTruthy();
  server.on('GET /api/teams/tern-rock', team());
  await user.click(screen.getByRole('button', { name: 'Try again' }));

  expect(await screen.findByRole('link', { name: 'Leaning Spout' })).toBeTruthy();
});
