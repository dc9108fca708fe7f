import { afterEach, beforeEach, expect, test, vi } from 'vitest';
import { getTeam, updateProblem } from '#shared/contracts/teams.ts';
import { ApiError, NOT_REACHED } from '#src/lib/api/api-error.ts';
import { signOut } from '#src/lib/api/boot-endpoints.ts';
import { call } from '#src/lib/api/call.ts';
import { forgetCsrfToken } from '#src/lib/api/csrf.ts';
import { endedSession, rememberSession, settleSignInAgain } from '#src/lib/session/sign-in-again.ts';
import { fakeServer, json, noContent, refusal, type FakeServer } from '../support/fake-server.ts';
import { problem, team } from '../support/invented.ts';

let server: FakeServer;
const PROBLEM = { team: 'tern-rock', number: 1 };

beforeEach(() => {
  server = fakeServer();
  forgetCsrfToken();
});

afterEach(() => {
  vi.unstubAllGlobals();
  rememberSession(null);
});

test('call, when an endpoint has parameters: puts them into its path, made safe', async () => {
  server.on('GET /api/teams/tern%20rock', team());

  const answer = await call(getTeam, { params: { team: 'tern rock' } });

  expect(answer.name).toBe('Tern Rock');
});

test('call, when a parameter is missing: throws before anything is sent', async () => {
  await expect(call(getTeam, {})).rejects.toThrow(TypeError);
});

test('call, when something is changed: brings the token, the version and the body', async () => {
  server.on('PATCH /api/teams/tern-rock/problems/1', () => json(problem()));

  await call(updateProblem, { params: PROBLEM, body: { title: 'Spout' }, ifMatch: 3 });

  const asked = server.asked('PATCH /api/teams/tern-rock/problems/1')[0];
  expect(asked?.headers.get('x-csrf-token')).toBe('token-1');
  expect(asked?.headers.get('if-match')).toBe('"3"');
  expect(asked?.body).toEqual({ title: 'Spout' });
});

test('call, when the token is refused: asks for a new one and sends the change once more', async () => {
  let tokens = 0;
  server.on('GET /api/csrf', () => json({ token: `token-${(tokens += 1)}` }));
  server.on('DELETE /api/session', (asked) =>
    asked.headers.get('x-csrf-token') === 'token-2' ? noContent() : refusal(403, 'csrf', 'Too old.'),
  );

  await call(signOut, {});

  expect(server.asked('DELETE /api/session')).toHaveLength(2);
});

test('call, when the answer is a refusal: throws its code, its sentence and its fields', async () => {
  server.on('PATCH /api/teams/tern-rock/problems/1', () =>
    refusal(422, 'invalid', 'Some fields need another look.', { title: 'Give the problem its short name.' }),
  );

  const failure = call(updateProblem, { params: PROBLEM, body: { title: '' } });

  await expect(failure).rejects.toMatchObject({
    status: 422,
    code: 'invalid',
    message: 'Some fields need another look.',
    fields: { title: 'Give the problem its short name.' },
    requestId: 'r-1',
  });
});

test('call, when the answer is no problem+json: still gives a sentence', async () => {
  server.on('GET /api/teams/tern-rock', () => new Response('<html>', { status: 502 }));

  const failure = call(getTeam, { params: { team: 'tern-rock' } });

  await expect(failure).rejects.toMatchObject({ status: 502, code: 'unexpected-answer' });
});

test('call, when the server cannot be reached: says so with its own code', async () => {
  server.setReachable(false);

  const failure: unknown = await call(getTeam, { params: { team: 'tern-rock' } }).catch(
    (error: unknown) => error,
  );

  expect(failure).toBeInstanceOf(ApiError);
  expect(failure).toMatchObject({ status: 0, code: NOT_REACHED });
});

test('call, when the session has ended for two calls at once: one sign-in serves both', async () => {
  rememberSession({ userId: 'p-ines', email: 'ines.farrow@skerry.example', name: 'Ines Farrow' });
  let isSignedIn = false;
  server.on('GET /api/teams/tern-rock', () =>
    isSignedIn ? json(team()) : refusal(401, 'not-signed-in', 'Sign in first.'),
  );

  const both = Promise.all([
    call(getTeam, { params: { team: 'tern-rock' } }),
    call(getTeam, { params: { team: 'tern-rock' } }),
  ]);
  await vi.waitFor(() => expect(endedSession.get()?.name).toBe('Ines Farrow'));
  isSignedIn = true;
  settleSignInAgain(true);

  expect((await both).map(({ slug }) => slug)).toEqual(['tern-rock', 'tern-rock']);
  expect(endedSession.get()).toBeNull();
});

test('call, when nobody was signed in: a refusal stays a refusal', async () => {
  server.on('GET /api/teams/tern-rock', () => refusal(401, 'not-signed-in', 'Sign in first.'));

  await expect(call(getTeam, { params: { team: 'tern-rock' } })).rejects.toMatchObject({
    code: 'not-signed-in',
  });
});
