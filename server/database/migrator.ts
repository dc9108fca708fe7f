import { SequelizeStorage, Umzug } from 'umzug';
import type { Database } from './database.ts';
import type { Migration } from './migration.ts';
import { people } from './migrations/0001-people.ts';
import { problems } from './migrations/0002-problems.ts';
import { audit } from './migrations/0003-audit.ts';
import { reports } from './migrations/0004-reports.ts';
import { editions } from './migrations/0005-editions.ts';
import { copies } from './migrations/0006-copies.ts';
import { notes } from './migrations/0007-notes.ts';
import { leaks } from './migrations/0008-leaks.ts';
import { invitations } from './migrations/0010-people.ts';
import { fights } from './migrations/0011-fights.ts';

/** In order. A table of imports rather than a folder that is read, so that the bundled server has them too. */
const MIGRATIONS: readonly Migration[] = [
  people,
  problems,
  audit,
  reports,
  editions,
  copies,
  notes,
  leaks,
  invitations,
  fights,
];

/** Brings the database up (or back down) one named step at a time, each in its own transaction. */
export function createMigrator(database: Database) {
  const step = (work: Migration['up']) => () =>
    database.write((transaction) =>
      work((statement) => database.sequelize.query(statement, { transaction, raw: true })),
    );
  return new Umzug({
    migrations: MIGRATIONS.map(({ name, up, down }) => ({ name, up: step(up), down: step(down) })),
    storage: new SequelizeStorage({ sequelize: database.sequelize, tableName: 'migrations' }),
    logger: undefined,
  });
}
