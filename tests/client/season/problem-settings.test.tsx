import { cleanup, screen } from '@testing-library/react';
import { afterEach, beforeEach, expect, test, vi } from 'vitest';
import { fakeServer, json, refusal, type FakeServer } from '../support/fake-server.ts';
import { emptyEvidence, problem, session, summary, team } from '../support/invented.ts';
import { renderAt, valueOf } from '../support/render-at.tsx';

const SETTINGS = '/team/tern-rock/problem/1/settings';
const PROBLEM = '/api/teams/tern-rock/problems/1';

let server: FakeServer;

beforeEach(() => {
  server = fakeServer();
  server.on('GET /api/session', session());
  server.on('GET /api/teams/tern-rock', team());
  server.on('GET /api/teams/tern-rock/problems', [summary()]);
  server.on(`GET ${PROBLEM}`, problem());
  server.on(`GET ${PROBLEM}/evidence`, { evidence: emptyEvidence(), rowVersions: {} });
});

afterEach(() => {
  cleanup();
  vi.unstubAllGlobals();
  localStorage.clear();
});

test('problem settings, when they are kept: sends every setting with the version it was made on', async () => {
  server.on(`PATCH ${PROBLEM}`, () => json(problem({ rowVersion: 4 })));
  const { user } = renderAt(SETTINGS);

  const k = await screen.findByLabelText(/Margin/);
  await user.clear(k);
  await user.type(k, '2,5');
  await user.click(screen.getByRole('radio', { name: 'two' }));
  await user.click(screen.getByRole('radio', { name: 'Letter' }));
  await user.click(screen.getByRole('button', { name: 'Keep settings' }));

  expect((await screen.findAllByText('Settings of Leaning Spout are kept.')).length).toBeGreaterThan(0);
  const asked = server.asked(`PATCH ${PROBLEM}`)[0];
  expect(asked?.headers.get('if-match')).toBe('"3"');
  expect(asked?.body).toEqual({
    title: 'Leaning Spout',
    statement: 'How far can its jet reach?',
    tasks: [{ id: 'task-reach', text: 'How far can its jet reach?' }],
    owners: ['p-ines'],
    settings: { k: 2.5, rounding: 'two digits', level: 0.95, paper: 'Letter' },
  });
});

test('problem settings, when a number cannot be: proposes one beside it and sends nothing', async () => {
  const { user } = renderAt(SETTINGS);

  await user.clear(await screen.findByLabelText(/Level of intervals/));
  await user.type(screen.getByLabelText(/Level of intervals/), '100');
  await user.click(screen.getByRole('button', { name: 'Keep settings' }));

  expect(await screen.findByText('Use per cent, more than 0 and less than 100; 95 is usual.')).toBeTruthy();
  expect(server.asked(`PATCH ${PROBLEM}`)).toHaveLength(0);
});

test('problem settings, when somebody changed them meanwhile: keeps what was typed, and shows theirs on demand', async () => {
  server.on(`PATCH ${PROBLEM}`, () =>
    refusal(
      409,
      'changed-meanwhile',
      'Kasimir Lund changed this problem meanwhile. Look at it and change it again.',
    ),
  );
  const { user } = renderAt(SETTINGS);
  await user.type(await screen.findByLabelText('Short name'), ' 2');
  await user.click(screen.getByRole('button', { name: 'Keep settings' }));
  await screen.findByText(/changed this problem meanwhile/);
  expect(valueOf(screen.getByLabelText('Short name'))).toBe('Leaning Spout 2');
  server.on(`GET ${PROBLEM}`, problem({ title: 'Leaning Can', rowVersion: 4 }));

  await user.click(screen.getByRole('button', { name: 'Show what stands there now' }));

  await vi.waitFor(() => expect(valueOf(screen.getByLabelText('Short name'))).toBe('Leaning Can'));
  expect(screen.queryByText(/changed this problem meanwhile/)).toBeNull();
});

test('problem settings, when an advisor reads them: says why nothing can be changed', async () => {
  server.on('GET /api/session', session('advisor'));
  renderAt(SETTINGS);

  expect(await screen.findByText(/the captain and the members change them/)).toBeTruthy();
  expect(screen.queryByRole('button', { name: 'Keep settings' })).toBeNull();
  expect(screen.getByLabelText('Short name').matches(':disabled')).toBe(true);
});
