/** Every route the app has, called as everybody: who may, who may not, and for whom it does not exist. */
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import type { Express } from 'express';
import { lend } from '#tests/support/lend.ts';
import { setUpAdministrator, signInAdministrator } from '#tests/support/administrator.ts';
import { startTestServer } from '#tests/support/server.ts';
import type { SignedIn, TestServer } from '#tests/support/server.ts';

const WHO = ['captain', 'member', 'advisor', 'other team', 'administrator', 'signed out'] as const;
type Who = (typeof WHO)[number];

/** Ways in which a route may be open; each column is what everybody is answered: yes, or the refusing status. */
const RIGHTS: Readonly<Record<string, Readonly<Record<Who, 'yes' | 401 | 403 | 404>>>> = {
  anybody: {
    captain: 'yes',
    member: 'yes',
    advisor: 'yes',
    'other team': 'yes',
    administrator: 'yes',
    'signed out': 'yes',
  },
  'signed in': {
    captain: 'yes',
    member: 'yes',
    advisor: 'yes',
    'other team': 'yes',
    administrator: 'yes',
    'signed out': 401,
  },
  'team reads': {
    captain: 'yes',
    member: 'yes',
    advisor: 'yes',
    'other team': 404,
    administrator: 404,
    'signed out': 401,
  },
  'team writes': {
    captain: 'yes',
    member: 'yes',
    advisor: 403,
    'other team': 404,
    administrator: 404,
    'signed out': 401,
  },
  'advisor only': {
    captain: 403,
    member: 403,
    advisor: 'yes',
    'other team': 404,
    administrator: 404,
    'signed out': 401,
  },
  'captain only': {
    captain: 'yes',
    member: 403,
    advisor: 403,
    'other team': 404,
    administrator: 404,
    'signed out': 401,
  },
  /** For everybody else there is nothing at these addresses. */
  'administrator only': {
    captain: 404,
    member: 404,
    advisor: 404,
    'other team': 404,
    administrator: 'yes',
    'signed out': 401,
  },
  /** Of a copy that the captain's team has lent, with its token. */
  'with the token': {
    captain: 'yes',
    member: 'yes',
    advisor: 'yes',
    'other team': 'yes',
    administrator: 'yes',
    'signed out': 'yes',
  },
  'token, not of the lender': {
    captain: 404,
    member: 404,
    advisor: 404,
    'other team': 'yes',
    administrator: 'yes',
    'signed out': 'yes',
  },
  /** The calls of this test have no key; the tests of the questions have. */
  'token and key, not of the lender': {
    captain: 404,
    member: 404,
    advisor: 404,
    'other team': 403,
    administrator: 403,
    'signed out': 403,
  },
};

const P = '/api/teams/:team/problems/:number';
const DEFINITIONS = ['instruments', 'quantities', 'series', 'models', 'comparisons', 'claims', 'charts'];

/** The right of every route. A route that is not here fails the test below. */
const MATRIX: Readonly<Record<string, string>> = {
  'GET /api/health': 'anybody',
  'GET /api/csrf': 'anybody',
  'POST /api/session': 'anybody',
  'GET /api/session': 'signed in',
  'DELETE /api/session': 'signed in',
  'PUT /api/account/password': 'signed in',
  'POST /api/password-resets': 'anybody',
  'PUT /api/password-resets/:token': 'anybody',
  'GET /api/invitations/:token': 'anybody',
  'POST /api/invitations/:token': 'anybody',
  'GET /api/setup/:token': 'anybody',
  'POST /api/setup/:token': 'anybody',
  'GET /api/admin/teams': 'administrator only',
  'POST /api/admin/teams': 'administrator only',
  'POST /api/admin/teams/:team/captains': 'administrator only',
  'GET /api/admin/people': 'administrator only',
  'PATCH /api/admin/people/:person': 'administrator only',
  'GET /api/teams/:team': 'team reads',
  'PATCH /api/teams/:team/members/:person': 'captain only',
  'DELETE /api/teams/:team/members/:person': 'captain only',
  'GET /api/teams/:team/invitations': 'captain only',
  'POST /api/teams/:team/invitations': 'captain only',
  'DELETE /api/teams/:team/invitations/:invitation': 'captain only',
  'GET /api/teams/:team/outbox': 'captain only',
  'POST /api/teams/:team/outbox/:mail/retry': 'captain only',
  'GET /api/teams/:team/fights': 'team reads',
  'POST /api/teams/:team/fights': 'captain only',
  'PUT /api/teams/:team/fights/:id': 'captain only',
  'DELETE /api/teams/:team/fights/:id': 'captain only',
  'GET /api/teams/:team/events': 'team reads',
  'POST /api/teams/:team/events': 'captain only',
  'PUT /api/teams/:team/events/:id': 'captain only',
  'DELETE /api/teams/:team/events/:id': 'captain only',
  'GET /api/teams/:team/problems': 'team reads',
  'POST /api/teams/:team/problems': 'team writes',
  [`GET ${P}`]: 'team reads',
  [`PATCH ${P}`]: 'team writes',
  [`GET ${P}/evidence`]: 'team reads',
  [`GET ${P}/findings`]: 'team reads',
  ...Object.fromEntries(
    DEFINITIONS.flatMap((table) => [
      [`POST ${P}/${table}`, 'team writes'],
      [`PUT ${P}/${table}/:id`, 'team writes'],
      [`DELETE ${P}/${table}/:id`, 'team writes'],
    ]),
  ),
  [`POST ${P}/series/:series/trials`]: 'team writes',
  [`PATCH ${P}/trials/:trial`]: 'team writes',
  [`GET ${P}/report`]: 'team reads',
  [`GET ${P}/report.pdf`]: 'team reads',
  [`POST ${P}/files`]: 'team writes',
  [`GET ${P}/files/:sha`]: 'team reads',
  [`POST ${P}/exports`]: 'team reads',
  [`GET ${P}/exports/:export`]: 'team reads',
  [`DELETE ${P}/exports/:export`]: 'team reads',
  [`GET ${P}/exports/:export/file`]: 'team reads',
  [`GET ${P}/notes`]: 'team reads',
  [`POST ${P}/notes`]: 'advisor only',
  [`POST ${P}/notes/:note/answers`]: 'team writes',
  /** Who may make which change is tested with the notes. */
  [`PATCH ${P}/notes/:note`]: 'team reads',
  [`GET ${P}/leaks`]: 'team reads',
  [`PUT ${P}/leaks/:leak/answer`]: 'team writes',
  [`GET ${P}/editions`]: 'team reads',
  [`POST ${P}/editions`]: 'captain only',
  [`GET ${P}/editions/:n`]: 'team reads',
  [`GET ${P}/editions/:n/report.pdf`]: 'team reads',
  [`GET ${P}/editions/:n/compare/:other`]: 'team reads',
  'GET /api/teams/:team/copies': 'team reads',
  [`GET ${P}/copies`]: 'team reads',
  [`POST ${P}/editions/:n/copies`]: 'captain only',
  [`PATCH ${P}/copies/:copy`]: 'captain only',
  [`GET ${P}/copies/:copy/preview`]: 'captain only',
  'GET /api/copies/:token': 'with the token',
  'POST /api/copies/:token/opening': 'with the token',
  'GET /api/copies/:token/standing': 'with the token',
  'GET /api/copies/:token/files/:sha': 'with the token',
  'GET /api/copies/:token/report.pdf': 'with the token',
  'GET /api/copies/:token/room': 'token, not of the lender',
  'POST /api/copies/:token/room': 'token, not of the lender',
  'PATCH /api/copies/:token/room': 'token and key, not of the lender',
  'GET /api/copies/:token/questions': 'token and key, not of the lender',
  'POST /api/copies/:token/questions': 'token and key, not of the lender',
  'PATCH /api/copies/:token/questions/:question': 'token and key, not of the lender',
  'DELETE /api/copies/:token/questions/:question': 'token and key, not of the lender',
};

let app: TestServer;
/** Token of a copy that Tern Rock has lent. */
let lent = '';
const people = new Map<Who, SignedIn>();
beforeAll(async () => {
  app = await startTestServer();
  await setUpAdministrator(app);
  for (const who of WHO) await enter(who);
  ({ token: lent } = await lend(await app.signIn('ines')));
});
afterAll(() => app.stop());

const NAMES = { captain: 'ines', member: 'kasimir', advisor: 'odile', 'other team': 'sunniva' } as const;

async function enter(who: Who): Promise<void> {
  if (who === 'signed out') people.set(who, await app.stranger());
  else if (who === 'administrator') people.set(who, await signInAdministrator(app));
  else people.set(who, await app.signIn(NAMES[who]));
}

function routesOf(express: Express): string[] {
  return express.router.stack.flatMap(({ route }) => {
    if (!route) return [];
    const methods = route.stack.map(({ method }) => (method ?? '').toUpperCase());
    return [...new Set(methods)].map((method) => `${method} ${route.path}`);
  });
}

/** Calls a route with nothing but its address, which is enough to be let in or refused at the door. */
async function call(who: Who, route: string): Promise<number> {
  const person = people.get(who);
  if (!person) throw new RangeError(`call: needs somebody, got ${who}`);
  const [method = '', path = ''] = route.split(' ');
  const address = path
    .replace(':team', 'tern-rock')
    .replace(':number', '1')
    .replace(':person', 'absent')
    .replace(':token', lent)
    .replaceAll(/:\w+/g, 'absent');
  switch (method) {
    case 'GET':
      return (await person.get(address)).status;
    case 'POST':
      return (await person.post(address, {})).status;
    case 'PUT':
      return (await person.put(address, {})).status;
    case 'PATCH':
      return (await person.patch(address, {})).status;
    default:
      return (await person.delete(address, {})).status;
  }
}

/** Whoever is let in may still be told that the empty request is no good (422, 428) or that nothing is there (404). */
const REFUSALS = [401, 403];

describe('role matrix', () => {
  test('every route of the app, when it is added: is listed with its right', () => {
    expect(routesOf(app.server.app).sort()).toEqual(Object.keys(MATRIX).sort());
  });

  const rows = Object.entries(MATRIX).flatMap(([route, right]) => WHO.map((who) => ({ route, right, who })));

  test.each(rows)('$route, as $who: is as "$right" says', async ({ route, right, who }) => {
    const expected = RIGHTS[right]?.[who];

    const status = await call(who, route);
    // Signing out and in again changes who somebody is.
    if (route.endsWith(' /api/session')) await enter(who);

    if (expected === 'yes') expect(REFUSALS).not.toContain(status);
    else expect(status).toBe(expected);
    expect(status).toBeLessThan(500);
  });

  test.each(Object.keys(MATRIX).filter((route) => route.includes(':number')))(
    '%s, for a problem that the team does not have: answers 404 to its captain',
    async (route) => {
      expect(await call('captain', route.replace(':number', '99'))).toBe(404);
    },
  );
});
