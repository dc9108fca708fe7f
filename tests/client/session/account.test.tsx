import { cleanup, screen, within } from '@testing-library/react';
import { afterEach, beforeEach, expect, test, vi } from 'vitest';
import { digitKeys } from '#src/lib/preferences/digit-keys.ts';
import { settleSignInAgain } from '#src/lib/session/sign-in-again.ts';
import { fakeServer, noContent, refusal, type FakeServer } from '../support/fake-server.ts';
import { session } from '../support/invented.ts';
import { renderAt, valueOf } from '../support/render-at.tsx';

let server: FakeServer;

beforeEach(() => {
  server = fakeServer();
  server.on('GET /api/session', session());
  server.on('GET /api/health', { ok: true, version: '1', reportSchema: 1, demo: null });
});

afterEach(() => {
  cleanup();
  vi.unstubAllGlobals();
  localStorage.clear();
  digitKeys.set('on');
  settleSignInAgain(false);
});

test('change passphrase, when the present one is wrong: says so beside it and changes nothing', async () => {
  const sentence = 'This is not the passphrase you use now. Nothing was changed.';
  server.on('PUT /api/account/password', () =>
    refusal(422, 'wrong-passphrase', sentence, { current: sentence }),
  );
  const { user } = renderAt('/account');

  await user.type(await screen.findByLabelText('Passphrase you use now'), 'wrong');
  await user.type(screen.getByLabelText('New passphrase'), 'four quiet stones');
  await user.click(screen.getByRole('button', { name: 'Change passphrase' }));

  expect(await screen.findByText(sentence)).toBeTruthy();
  expect(screen.getByLabelText('Passphrase you use now').getAttribute('aria-invalid')).toBe('true');
  expect(valueOf(screen.getByLabelText('New passphrase'))).toBe('four quiet stones');
});

test('change passphrase, when the new one is short: proposes a longer one and asks nothing', async () => {
  const { user } = renderAt('/account');

  await user.type(await screen.findByLabelText('Passphrase you use now'), 'tern rock tide table');
  await user.type(screen.getByLabelText('New passphrase'), 'short');
  await user.click(screen.getByRole('button', { name: 'Change passphrase' }));

  expect(await screen.findByText('Use at least 12 characters; four unrelated words do well.')).toBeTruthy();
  expect(server.asked('PUT /api/account/password')).toHaveLength(0);
});

test('change passphrase, when it was changed: says the consequence', async () => {
  server.on('PUT /api/account/password', noContent);
  const { user } = renderAt('/account');

  await user.type(await screen.findByLabelText('Passphrase you use now'), 'tern rock tide table');
  await user.type(screen.getByLabelText('New passphrase'), 'four quiet stones');
  await user.click(screen.getByRole('button', { name: 'Change passphrase' }));

  const sentences = await screen.findAllByText('Your passphrase is changed. Other devices are signed out.');
  expect(sentences[0]).toBeTruthy();
  expect(valueOf(screen.getByLabelText('New passphrase'))).toBe('');
});

test('an ended session, when a change is sent: the person signs in again in place and the change is kept', async () => {
  let isSignedIn = false;
  server.on('PUT /api/account/password', () =>
    isSignedIn ? noContent() : refusal(401, 'not-signed-in', 'Sign in first.'),
  );
  server.on('POST /api/session', () => {
    isSignedIn = true;
    return new Response(JSON.stringify(session()), { status: 200 });
  });
  const { user } = renderAt('/account');
  await user.type(await screen.findByLabelText('Passphrase you use now'), 'tern rock tide table');
  await user.type(screen.getByLabelText('New passphrase'), 'four quiet stones');

  await user.click(screen.getByRole('button', { name: 'Change passphrase' }));
  expect(await screen.findByRole('dialog', { name: 'Are you still Ines Farrow?' })).toBeTruthy();
  expect(valueOf(screen.getByLabelText('University email'))).toBe('ines.farrow@skerry.example');
  const dialog = within(screen.getByRole('dialog'));
  await user.type(dialog.getByLabelText('Passphrase'), 'tern rock tide table');
  await user.click(dialog.getByRole('button', { name: 'Sign in' }));

  expect((await screen.findAllByText(/Your passphrase is changed/))[0]).toBeTruthy();
  expect(server.asked('PUT /api/account/password')).toHaveLength(2);
  expect(screen.queryByRole('dialog')).toBeNull();
});

test('an ended session, when the person does not sign in again: what they typed is still there', async () => {
  server.on('PUT /api/account/password', () => refusal(401, 'not-signed-in', 'You are signed out.'));
  const { user } = renderAt('/account');
  await user.type(await screen.findByLabelText('Passphrase you use now'), 'tern rock tide table');
  await user.type(screen.getByLabelText('New passphrase'), 'four quiet stones');

  await user.click(screen.getByRole('button', { name: 'Change passphrase' }));
  await user.click(await screen.findByRole('button', { name: 'Not now' }));

  expect(await screen.findByText('You are signed out.')).toBeTruthy();
  expect(valueOf(screen.getByLabelText('New passphrase'))).toBe('four quiet stones');
});

test('account, when the digits are switched off: the choice is kept in this browser', async () => {
  const { user } = renderAt('/account');

  await user.click(await screen.findByRole('checkbox', { name: /digits 1 to 3/ }));

  expect(digitKeys.get()).toBe('off');
  expect(localStorage.getItem('holdwater:digit-keys')).toBe('off');
});

test('account, when dark is chosen: the page is dark', async () => {
  const { user } = renderAt('/account');

  await user.click(await screen.findByRole('radio', { name: 'dark' }));

  expect(localStorage.getItem('holdwater:theme')).toBe('dark');
});

test('sign out, when it is done: the sign-in page stands there, and nothing of the team is kept', async () => {
  server.on('DELETE /api/session', noContent);
  const { user, client } = renderAt('/account');
  const button = await screen.findByRole('button', { name: 'Sign out' });
  server.on('GET /api/session', () => refusal(401, 'not-signed-in', 'Sign in first.'));

  await user.click(button);

  expect(await screen.findByRole('heading', { name: 'Sign in' })).toBeTruthy();
  expect(client.getQueryData(['session'])).toBeNull();
});
