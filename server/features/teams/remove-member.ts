import { AppError } from '#server/errors/app-error.ts';
import { notFound } from '#server/errors/refusals.ts';
import type { ServerDeps } from '#server/deps.ts';
import { auditTeam } from './audit-team.ts';
import { listPeople } from './service.ts';
import type { TeamPlace } from './service.ts';

/**
 * Takes a person out of the team; what they logged and wrote stays. Their open sockets end, and what comes back sees
 * the team no more. 404 for who is not in it; 409 `last-captain`.
 */
export async function removeMember(
  { database, sockets, now }: Pick<ServerDeps, 'database' | 'sockets' | 'now'>,
  place: TeamPlace,
  { by, person }: { readonly by: string; readonly person: string },
): Promise<void> {
  const teamId = place.team.id;
  await database.write(async (transaction) => {
    const people = await listPeople(database, teamId, transaction);
    const found = people.find(({ id }) => id === person);
    if (!found) throw notFound('Nobody of this team is meant by this address.');
    if (found.role === 'captain' && people.filter(({ role }) => role === 'captain').length === 1) {
      throw new AppError(
        409,
        'last-captain',
        `${found.name} is the only captain. Make somebody else captain first.`,
      );
    }
    await database.models.memberships.destroy({ where: { teamId, userId: person }, transaction });
    const before = { table: 'memberships', id: person, role: found.role };
    await auditTeam(
      database,
      { teamId, by, now: now(), action: 'remove from team', before, after: null },
      transaction,
    );
  });
  sockets.closePerson(person);
}
