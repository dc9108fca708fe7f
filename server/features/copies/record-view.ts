import type { TeamPlace } from '#server/features/teams/service.ts';
import type { ReadingDeps } from './find-copy.ts';
import type { CopyModel, CopyViewModel } from './model.ts';

/** A page that is loaded again at once was not opened twice. */
const SAME_VIEW_MS = 5_000;

/** Logs that a copy was opened or printed, and when; the team that lent it is told. */
export async function recordView(
  { database, now, events }: ReadingDeps,
  copy: CopyModel,
  kind: CopyViewModel['kind'],
): Promise<void> {
  const at = now();
  const isNew = await database.write(async (transaction) => {
    const { copyViews } = database.models;
    const last = (await copyViews.max('at', { where: { copyId: copy.id, kind }, transaction })) as
      string | null;
    if (last !== null && at.getTime() - Date.parse(last) < SAME_VIEW_MS) return false;
    await copyViews.create({ copyId: copy.id, at: at.toISOString(), kind }, { transaction });
    return true;
  });
  if (!isNew) return;
  const team = await database.models.teams.findByPk(copy.teamId, { attributes: ['slug'], raw: true });
  const lender: TeamPlace = { team: { id: copy.teamId, slug: team?.slug ?? '' }, role: 'captain' };
  events.publishStale(lender, 'copies');
}
