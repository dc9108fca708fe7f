/** Sockets carry cookies like every request, and are not protected by CORS: who may open one is checked on the upgrade. */
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { startTestServer } from '#tests/support/server.ts';
import type { TestServer } from '#tests/support/server.ts';
import { openSocket, refusedSocket } from '#tests/support/socket.ts';

let app: TestServer;
let cookie: string;
beforeAll(async () => {
  app = await startTestServer();
  ({ cookie } = await app.signIn('kasimir'));
});
afterAll(() => app.stop());

describe.each(['/events', '/collaboration'])('socket %s', (path) => {
  test('when nobody is signed in: is refused with 401', async () => {
    expect(await refusedSocket(app.url, path, '')).toBe(401);
  });

  test('when the cookie is forged: is refused with 401', async () => {
    const forged = cookie.replace(/holdwater=[^;]*/, 'holdwater=s%3Aforged.signature');

    expect(await refusedSocket(app.url, path, forged)).toBe(401);
  });

  test.each(['https://elsewhere.example', 'null', 'not an address'])(
    'when a page of %s opens it with the cookie: is refused with 403',
    async (origin) => {
      expect(await refusedSocket(app.url, path, cookie, origin)).toBe(403);
    },
  );

  test('when our own page opens it signed in: is accepted', async () => {
    const socket = await openSocket(app.url, path, cookie);

    expect(socket.isOpen()).toBe(true);
    socket.close();
  });
});

test('socket, when the path is not one: is refused with 404', async () => {
  expect(await refusedSocket(app.url, '/elsewhere', cookie)).toBe(404);
});
