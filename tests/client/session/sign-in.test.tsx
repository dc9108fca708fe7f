import { cleanup, screen } from '@testing-library/react';
import { afterEach, beforeEach, expect, test, vi } from 'vitest';
import { fakeServer, json, refusal, type FakeServer } from '../support/fake-server.ts';
import { session, summary, team } from '../support/invented.ts';
import { renderAt, valueOf } from '../support/render-at.tsx';

let server: FakeServer;

beforeEach(() => {
  server = fakeServer();
  server.on('GET /api/session', () => refusal(401, 'not-signed-in', 'Sign in first.'));
  server.on('GET /api/health', { ok: true, version: '1', reportSchema: 1, demo: null });
  server.on('GET /api/teams/tern-rock', team());
  server.on('GET /api/teams/tern-rock/problems', [summary()]);
});

afterEach(() => {
  cleanup();
  vi.unstubAllGlobals();
  localStorage.clear();
});

test('sign in, when address and passphrase fit: goes on to the Season', async () => {
  server.on('POST /api/session', session());
  const { user } = renderAt('/');

  await user.type(await screen.findByLabelText('University email'), 'ines.farrow@skerry.example');
  await user.type(screen.getByLabelText('Passphrase'), 'tern rock tide table');
  await user.click(screen.getByRole('button', { name: 'Sign in' }));

  expect(await screen.findByRole('link', { name: 'Leaning Spout' })).toBeTruthy();
  expect(server.asked('POST /api/session')[0]?.body).toEqual({
    email: 'ines.farrow@skerry.example',
    passphrase: 'tern rock tide table',
  });
  expect(server.asked('POST /api/session')[0]?.headers.get('x-csrf-token')).toBe('token-1');
});

test('sign in, when they do not fit: says so beside the form and keeps what was typed', async () => {
  server.on('POST /api/session', () =>
    refusal(401, 'wrong-credentials', 'This e-mail and passphrase do not fit together.'),
  );
  const { user } = renderAt('/');

  await user.type(await screen.findByLabelText('University email'), 'ines.farrow@skerry.example');
  await user.type(screen.getByLabelText('Passphrase'), 'wrong');
  await user.click(screen.getByRole('button', { name: 'Sign in' }));

  expect((await screen.findByRole('alert')).textContent).toContain('do not fit together');
  expect(valueOf(screen.getByLabelText('University email'))).toBe('ines.farrow@skerry.example');
});

test('sign in, when a field is left out or half an address is written: says what to write and asks nothing', async () => {
  const { user } = renderAt('/');

  await user.type(await screen.findByLabelText('University email'), 'ines.farrow');
  await user.click(screen.getByRole('button', { name: 'Sign in' }));

  expect(await screen.findByText('Write the whole address, like ines.farrow@skerry.example.')).toBeTruthy();
  expect(screen.getByText('Write your passphrase.')).toBeTruthy();
  expect(server.asked('POST /api/session')).toHaveLength(0);
});

test('sign in, when the server cannot be reached: says so and can be tried again', async () => {
  const { user } = renderAt('/');
  await user.type(await screen.findByLabelText('University email'), 'ines.farrow@skerry.example');
  await user.type(screen.getByLabelText('Passphrase'), 'tern rock tide table');
  server.setReachable(false);

  await user.click(screen.getByRole('button', { name: 'Sign in' }));

  expect((await screen.findByRole('alert')).textContent).toContain('The server cannot be reached.');
  expect(valueOf(screen.getByLabelText('Passphrase'))).toBe('tern rock tide table');
});

test('sign in, when the installation shows its demonstration: each of its people is a word that signs in', async () => {
  server.on('GET /api/health', {
    ok: true,
    version: '1',
    reportSchema: 1,
    demo: [
      {
        name: 'Kasimir Lund',
        email: 'kasimir.lund@skerry.example',
        passphrase: 'brass ruler',
        role: 'member',
      },
    ],
  });
  server.on('POST /api/session', session('member'));
  const { user } = renderAt('/');

  await user.click(await screen.findByRole('button', { name: 'Kasimir Lund' }));

  expect(await screen.findByRole('link', { name: 'Leaning Spout' })).toBeTruthy();
  expect(server.asked('POST /api/session')[0]?.body).toEqual({
    email: 'kasimir.lund@skerry.example',
    passphrase: 'brass ruler',
  });
});

test('sign in, when there is no demonstration: none is offered', async () => {
  renderAt('/');

  expect(await screen.findByRole('heading', { name: 'Sign in' })).toBeTruthy();
  expect(screen.queryByRole('region', { name: 'Demonstration' })).toBeNull();
});

test('sign in, when a page was asked for: goes on to it, but never to another site', async () => {
  server.on('GET /api/session', session());

  const asked = renderAt('/?to=%2Faccount');
  expect(await screen.findByRole('heading', { name: 'Ines Farrow' })).toBeTruthy();
  asked.unmount();
  renderAt('/?to=%2F%2Felsewhere.example');

  expect(await screen.findByRole('link', { name: 'Leaning Spout' })).toBeTruthy();
});

test('sign in, when a person is in no team: says whom to ask, and lets them out', async () => {
  server.on('GET /api/session', { ...session(), teams: [] });
  renderAt('/');

  expect(await screen.findByRole('heading', { name: 'You are in no team yet' })).toBeTruthy();
  expect(screen.getByRole('button', { name: 'Sign out' })).toBeTruthy();
});

test('a page of a team, when nobody is signed in: asks to sign in and then shows it', async () => {
  server.on('POST /api/session', () => json(session()));
  const { user, router } = renderAt('/account');

  await user.type(await screen.findByLabelText('University email'), 'ines.farrow@skerry.example');
  await user.type(screen.getByLabelText('Passphrase'), 'tern rock tide table');
  await user.click(screen.getByRole('button', { name: 'Sign in' }));

  expect(await screen.findByRole('heading', { name: 'Ines Farrow' })).toBeTruthy();
  expect(router.state.location.pathname).toBe('/account');
});
