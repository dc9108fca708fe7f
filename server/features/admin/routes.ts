import type { Express } from 'express';
import * as contracts from '#shared/contracts/admin.ts';
import type { ServerDeps } from '#server/deps.ts';
import { getSession } from '#server/features/teams/service.ts';
import { mountAdministrator, mountOpen } from '#server/middleware/mount.ts';
import { tokenLimit } from '#server/middleware/rate-limits.ts';
import { changePerson, listAllPeople } from './people.ts';
import { readSetup, setUp } from './setup.ts';
import { createTeam, inviteCaptain, listAllTeams } from './teams.ts';

export function mountAdmin(app: Express, deps: ServerDeps): void {
  const before = [tokenLimit(deps.limits)];
  mountOpen(app, contracts.getSetup, ({ param }) => readSetup(deps, param('token')), { before });
  mountOpen(
    app,
    contracts.setUp,
    async ({ body, param, request }) => {
      const user = await setUp(deps, param('token'), body);
      await deps.session.logIn(request, user);
      return getSession(deps.database, user);
    },
    { before },
  );

  const { database } = deps;
  mountAdministrator(app, database, contracts.listAllTeams, () => listAllTeams(deps));
  mountAdministrator(app, database, contracts.createTeam, ({ actor, body }) => createTeam(deps, actor, body));
  mountAdministrator(app, database, contracts.inviteCaptain, ({ actor, body, param }) =>
    inviteCaptain(deps, actor, param('team'), body),
  );
  mountAdministrator(app, database, contracts.listAllPeople, () => listAllPeople(database));
  mountAdministrator(app, database, contracts.changePerson, ({ actor, body, param }) =>
    changePerson(deps, actor, param('person'), body),
  );
}
