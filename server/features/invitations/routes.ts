import type { Express } from 'express';
import * as contracts from '#shared/contracts/people.ts';
import type { ServerDeps } from '#server/deps.ts';
import { getSession } from '#server/features/teams/service.ts';
import { listOutbox, retryMail } from '#server/mail/outbox.ts';
import { mountOpen, mountTeam } from '#server/middleware/mount.ts';
import { askLimit, invitationLimits } from '#server/middleware/rate-limits.ts';
import { acceptInvitation } from './accept-invitation.ts';
import { readInvitation } from './find-invitation.ts';
import { listInvitations, withdrawInvitation, writeInvitation } from './service.ts';

export function mountInvitations(app: Express, deps: ServerDeps): void {
  mountTeamInvitations(app, deps);
  mountOutbox(app, deps);

  const before = invitationLimits(deps.limits);
  mountOpen(app, contracts.getInvitation, ({ param }) => readInvitation(deps, param('token')), { before });
  mountOpen(
    app,
    contracts.acceptInvitation,
    async ({ body, param, request }) => {
      const { user, team } = await acceptInvitation(deps, param('token'), body);
      await deps.session.logIn(request, user);
      return { team, session: await getSession(deps.database, user) };
    },
    { before },
  );
}

function mountTeamInvitations(app: Express, deps: ServerDeps): void {
  const { database, events, mail } = deps;
  mountTeam(app, database, contracts.listInvitations, 'captain', ({ place }) =>
    listInvitations(deps, place.team.id),
  );
  mountTeam(
    app,
    database,
    contracts.invite,
    'captain',
    async ({ place, actor, body }) => {
      const invitation = await database.write((transaction) =>
        writeInvitation(deps, place.team.id, actor, body, transaction),
      );
      events.publishStale(place, 'invitations');
      void mail.wake();
      return invitation;
    },
    { before: [askLimit(deps.limits)] },
  );
  mountTeam(app, database, contracts.withdrawInvitation, 'captain', async ({ place, actor, param }) => {
    await withdrawInvitation(deps, place.team.id, { by: actor.id, id: param('invitation') });
    events.publishStale(place, 'invitations');
    events.publishStale(place, 'outbox');
  });
}

function mountOutbox(app: Express, { database, now, mail }: ServerDeps): void {
  mountTeam(app, database, contracts.listOutbox, 'captain', ({ place }) =>
    listOutbox(database, place.team.id),
  );
  mountTeam(app, database, contracts.retryMail, 'captain', async ({ place, param }) => {
    await retryMail(database, place.team.id, param('mail'), now());
    void mail.wake();
  });
}
