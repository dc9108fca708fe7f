import { Op } from 'sequelize';
import type { Database } from '#server/database/database.ts';

/** Drops sessions whose time is over. */
export async function clearExpiredSessions(database: Database, now: Date): Promise<void> {
  await database.write((transaction) =>
    database.models.sessions.destroy({ where: { expires: { [Op.lt]: now } }, transaction }),
  );
}
