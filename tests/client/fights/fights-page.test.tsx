/** Fights and events as the captain sets them and the others read them; only the network is faked. */
import { cleanup, screen, within } from '@testing-library/react';
import { afterEach, beforeEach, expect, test, vi } from 'vitest';
import exampleA from '#templates/events/example-a.json';
import type { Role } from '#shared/contracts/session.ts';
import { fakeServer, json, refusal, type FakeServer } from '#tests/client/support/fake-server.ts';
import { session, summary, team } from '#tests/client/support/invented.ts';
import { renderAt } from '#tests/client/support/render-at.tsx';

const FIGHT = {
  id: 'f-2',
  name: 'Fight 2',
  at: '2026-03-14T09:30:00.000Z',
  event: 'e-a',
  rowVersion: 3,
  stages: [{ role: 'report', problem: 1, against: 'Gannet Bank' }],
};

let server: FakeServer;
beforeEach(() => localStorage.clear());
afterEach(() => {
  cleanup();
  vi.unstubAllGlobals();
});

function open(role: Role, fights: readonly object[] = [FIGHT]) {
  server = fakeServer();
  server.on('GET /api/session', session(role));
  server.on('GET /api/teams/tern-rock', team());
  server.on('GET /api/teams/tern-rock/problems', [summary()]);
  server.on('GET /api/teams/tern-rock/fights', [...fights]);
  server.on('GET /api/teams/tern-rock/events', [{ ...exampleA, id: 'e-a', rowVersion: 1 }]);
  return renderAt('/team/tern-rock/fights');
}

test('fights, as a member: are told in words, and cannot be changed', async () => {
  open('member');

  expect(await screen.findByText(/In stage 1 we report .* to Gannet Bank\./)).toBeTruthy();
  expect(screen.getByText(/held by the rules of Example event A/)).toBeTruthy();
  expect(screen.getByText('50 minutes a stage, twelve of them the report.', { exact: false })).toBeTruthy();
  expect(screen.queryByRole('button', { name: /Change|Add a fight|Begin from/ })).toBeNull();
});

test('a fight, when the captain keeps it: is sent with the version it was made on', async () => {
  const { user } = open('captain');
  server.on('PUT /api/teams/tern-rock/fights/f-2', () => json(FIGHT));

  await user.click(await screen.findByRole('button', { name: /Change ?Fight 2/ }));
  await user.type(screen.getByLabelText('Place'), 'Old boathouse');
  await user.click(screen.getByRole('button', { name: 'Keep the fight' }));

  await vi.waitFor(() => {
    const [sent] = server.asked('PUT /api/teams/tern-rock/fights/f-2');
    expect(sent?.headers.get('if-match')).toBe('"3"');
    expect(sent?.body).toMatchObject({
      place: 'Old boathouse',
      stages: [{ problem: 1, against: 'Gannet Bank' }],
    });
  });
});

test('a fight, when it has no name and no day: says what is missing, and nothing is sent', async () => {
  const { user } = open('captain', []);

  await user.click(await screen.findByRole('button', { name: 'Add a fight' }));
  await user.click(screen.getByRole('button', { name: 'Keep the fight' }));

  expect(await screen.findByText('Give the fight a name.')).toBeTruthy();
  expect(screen.getByText('Give the day and time of the fight.')).toBeTruthy();
  expect(server.asked('POST /api/teams/tern-rock/fights')).toEqual([]);
});

test('an event, when a block lasts no time: says which, and nothing is sent', async () => {
  const { user } = open('captain');
  await user.click(await screen.findByRole('button', { name: /Change ?Example event A/ }));
  const block = screen.getByRole('group', { name: 'Block 1' });
  await user.clear(within(block).getByLabelText('To minute'));
  await user.type(within(block).getByLabelText('To minute'), '0');

  await user.click(screen.getByRole('button', { name: 'Keep the event' }));

  expect(await screen.findByText(/A block lasts longer than zero minutes\./)).toBeTruthy();
  expect(server.asked('PUT /api/teams/tern-rock/events/e-a')).toEqual([]);
});

test('fights, when the server does not answer: says so, and trying again brings them', async () => {
  const { user } = open('member');
  server.on('GET /api/teams/tern-rock/fights', () =>
    refusal(500, 'internal', 'Something went wrong here. Try again.'),
  );

  const again = await screen.findByRole('button', { name: 'Try again' });
  server.on('GET /api/teams/tern-rock/fights', () => json([FIGHT]));
  await user.click(again);

  expect(await screen.findByText(/In stage 1 we report/)).toBeTruthy();
});
