import type { Express } from 'express';
import { changeRole as changeRoleEndpoint, getTeam as getTeamEndpoint } from '#shared/contracts/teams.ts';
import { removeMember as removeMemberEndpoint } from '#shared/contracts/people.ts';
import type { ServerDeps } from '#server/deps.ts';
import { mountTeam } from '#server/middleware/mount.ts';
import { removeMember } from './remove-member.ts';
import { changeRole, getTeam } from './service.ts';

export function mountTeams(app: Express, deps: ServerDeps): void {
  mountTeam(app, deps.database, getTeamEndpoint, 'read', ({ place }) => getTeam(deps.database, place));

  mountTeam(app, deps.database, changeRoleEndpoint, 'captain', async ({ place, actor, body, param }) => {
    const person = await changeRole(deps, place, { by: actor.id, person: param('person'), role: body.role });
    deps.events.publishStale(place, 'team');
    return person;
  });

  mountTeam(app, deps.database, removeMemberEndpoint, 'captain', async ({ place, actor, param }) => {
    await removeMember(deps, place, { by: actor.id, person: param('person') });
    deps.events.publishStale(place, 'team');
  });
}
