import type { Express } from 'express';
import * as contracts from '#shared/contracts/fights.ts';
import type { ServerDeps } from '#server/deps.ts';
import { getIfMatch } from '#server/middleware/if-match.ts';
import { mountTeam } from '#server/middleware/mount.ts';
import { listEvents, listKeptFights, removeRow, writeEvent, writeFight } from './service.ts';
import type { Change } from './service.ts';

export function mountFights(app: Express, deps: ServerDeps): void {
  const { database, now, events } = deps;
  /** Does a change, then tells every tab of the team that it has become old. */
  const told = async <T>(place: Change['place'], by: string, work: (change: Change) => Promise<T>) => {
    const answer = await work({ database, now, place, by });
    events.publishStale(place, 'team');
    return answer;
  };

  mountTeam(app, database, contracts.listFights, 'read', ({ place }) =>
    listKeptFights(database, place.team.id),
  );
  mountTeam(app, database, contracts.createFight, 'captain', ({ place, actor, body }) =>
    told(place, actor.id, (change) => writeFight(change, body, null)),
  );
  mountTeam(app, database, contracts.updateFight, 'captain', ({ place, actor, body, param, request }) => {
    const kept = { id: param('id'), rowVersion: getIfMatch(request) };
    return told(place, actor.id, (change) => writeFight(change, body, kept));
  });
  mountTeam(app, database, contracts.removeFight, 'captain', ({ place, actor, param, request }) => {
    const kept = { id: param('id'), rowVersion: getIfMatch(request) };
    return told(place, actor.id, (change) => removeRow(change, 'fights', kept));
  });

  mountTeam(app, database, contracts.listEvents, 'read', ({ place }) => listEvents(database, place.team.id));
  mountTeam(app, database, contracts.createEvent, 'captain', ({ place, actor, body }) =>
    told(place, actor.id, (change) => writeEvent(change, body, null)),
  );
  mountTeam(app, database, contracts.updateEvent, 'captain', ({ place, actor, body, param, request }) => {
    const kept = { id: param('id'), rowVersion: getIfMatch(request) };
    return told(place, actor.id, (change) => writeEvent(change, body, kept));
  });
  mountTeam(app, database, contracts.removeEvent, 'captain', ({ place, actor, param, request }) => {
    const kept = { id: param('id'), rowVersion: getIfMatch(request) };
    return told(place, actor.id, (change) => removeRow(change, 'events', kept));
  });
}
