import { cleanup, screen } from '@testing-library/react';
import { afterEach, beforeAll, beforeEach, expect, test, vi } from 'vitest';
import { fakeServer, json, refusal, type FakeServer } from '../support/fake-server.ts';
import { session, summary, team } from '../support/invented.ts';
import { renderAt, valueOf } from '../support/render-at.tsx';

let server: FakeServer;

beforeAll(async () => {
  await import('#src/app/screens/trials-screen.tsx');
}, 90_000);

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

const NEW = '/team/tern-rock/new-problem';
const TASK = 'A jar of sand rolls down a slope. Where does it stop? Predict the distance.';

test('new problem, when a task is pasted: proposes what it asks, and sends what was made of it', async () => {
  server.on('POST /api/teams/tern-rock/problems', () => json({ number: 12 }, 201));
  const { user, router } = renderAt(NEW);

  await user.type(await screen.findByLabelText('Number'), '12');
  await user.type(screen.getByLabelText('Short name'), 'Sand Roller');
  await user.click(screen.getByLabelText('The task, as it was set'));
  await user.paste(TASK);
  expect(valueOf(screen.getByLabelText('Question 1'))).toBe('Where does it stop?');
  await user.clear(screen.getByLabelText('Question 2'));
  await user.type(screen.getByLabelText('Question 2'), 'How far does it roll?');
  await user.click(screen.getByRole('checkbox', { name: 'Kasimir Lund' }));
  await user.click(screen.getByRole('button', { name: 'Begin problem' }));

  await vi.waitFor(() => expect(router.state.location.pathname).toContain('/problem/12'), {
    timeout: 15_000,
  });
  expect(server.asked('POST /api/teams/tern-rock/problems')[0]?.body).toEqual({
    number: 12,
    title: 'Sand Roller',
    statement: TASK,
    tasks: ['Where does it stop?', 'How far does it roll?'],
    owners: ['p-kasimir'],
  });
});

test('new problem, when questions were edited: a further change of the task leaves them alone', async () => {
  const { user } = renderAt(NEW);
  await user.click(await screen.findByLabelText('The task, as it was set'));
  await user.paste(TASK);

  await user.click(screen.getByRole('button', { name: 'Remove question 2' }));
  await user.type(screen.getByLabelText('The task, as it was set'), ' Why?');

  expect(screen.queryByLabelText('Question 2')).toBeNull();
  expect(valueOf(screen.getByLabelText('Question 1'))).toBe('Where does it stop?');
});

test('new problem, when fields are missing or wrong: says what to write beside each', async () => {
  const { user } = renderAt(NEW);

  await user.type(await screen.findByLabelText('Number'), '1.5');
  await user.click(screen.getByRole('button', { name: 'Begin problem' }));

  expect(await screen.findByText('Use a whole number from 1 to 999.')).toBeTruthy();
  expect(screen.getByText('Give the problem its short name.')).toBeTruthy();
  expect(screen.getByText('Paste the task as it was set.')).toBeTruthy();
  expect(server.asked('POST /api/teams/tern-rock/problems')).toHaveLength(0);
});

test('new problem, when its number is taken: says so beside the number and keeps the rest', async () => {
  const sentence = 'Problem 1 is there already: Leaning Spout. Use another number.';
  server.on('POST /api/teams/tern-rock/problems', () => refusal(409, 'number-taken', sentence));
  const { user } = renderAt(NEW);
  await user.type(await screen.findByLabelText('Number'), '1');
  await user.type(screen.getByLabelText('Short name'), 'Sand Roller');
  await user.click(screen.getByLabelText('The task, as it was set'));
  await user.paste(TASK);

  await user.click(screen.getByRole('button', { name: 'Begin problem' }));

  await vi.waitFor(() => expect(screen.getByLabelText('Number').getAttribute('aria-invalid')).toBe('true'));
  expect(screen.getAllByText(sentence).length).toBeGreaterThan(0);
  expect(valueOf(screen.getByLabelText('Short name'))).toBe('Sand Roller');
});

test('new problem, when an advisor opens it: says who begins one, and offers no form', async () => {
  server.on('GET /api/session', session('advisor'));
  renderAt(NEW);

  expect(await screen.findByText(/the captain and the members begin a problem/)).toBeTruthy();
  expect(screen.queryByRole('button', { name: 'Begin problem' })).toBeNull();
});
