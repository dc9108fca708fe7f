import { act, cleanup, screen } from '@testing-library/react';
import { afterEach, beforeEach, expect, test, vi } from 'vitest';
import { fakeServer, type FakeServer } from '../support/fake-server.ts';
import { session, summary, team } from '../support/invented.ts';
import { renderAt } from '../support/render-at.tsx';

let server: FakeServer;

beforeEach(() => {
  server = fakeServer();
  server.on('GET /api/session', session());
  server.on('GET /api/teams/tern-rock', team());
  server.on('GET /api/teams/tern-rock/problems', [summary()]);
});

afterEach(() => {
  cleanup();
  vi.unstubAllGlobals();
  localStorage.clear();
});

test('top line, when the server goes away and comes back: says so in words, and then no longer', async () => {
  renderAt('/team/tern-rock');
  await screen.findByRole('link', { name: 'Leaning Spout' });
  act(() => server.sockets.at(-1)?.opens());
  expect(screen.queryByText(/Server not reached/)).toBeNull();

  act(() => server.sockets.at(-1)?.breaks());
  expect((await screen.findAllByText('Server not reached. Trying again.')).length).toBeGreaterThan(0);
  await vi.waitFor(() => expect(server.sockets.length).toBeGreaterThan(1));
  act(() => server.sockets.at(-1)?.opens());

  expect(screen.queryByText(/Server not reached/)).toBeNull();
});

test('season, when somebody else changes a problem: what is shown is asked for again', async () => {
  renderAt('/team/tern-rock');
  await screen.findByRole('link', { name: 'Leaning Spout' });
  server.on('GET /api/teams/tern-rock/problems', [summary({ title: 'Leaning Can' })]);

  act(() => server.sockets.at(-1)?.says({ type: 'stale', what: 'problems', team: 'tern-rock' }));

  expect(await screen.findByRole('link', { name: 'Leaning Can' })).toBeTruthy();
});
