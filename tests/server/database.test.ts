import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterEach, beforeEach, expect, test } from 'vitest';
import { QueryTypes } from 'sequelize';
import { openDatabase } from '#server/database/database.ts';
import type { Database } from '#server/database/database.ts';
import { createMigrator } from '#server/database/migrator.ts';

let folder: string;
let database: Database;
beforeEach(() => {
  folder = mkdtempSync(join(tmpdir(), 'holdwater-database-'));
  database = openDatabase(join(folder, 'test.sqlite'));
});
afterEach(async () => {
  await database.close();
  rmSync(folder, { recursive: true, force: true });
});

const select = async (statement: string) =>
  database.sequelize.query<Record<string, unknown>>(statement, { type: QueryTypes.SELECT });
const tables = async () =>
  (await select("SELECT name FROM sqlite_master WHERE type = 'table' AND name NOT LIKE 'sqlite_%'"))
    .map(({ name }) => String(name))
    .sort();

test('migrations, when run up: make every table that is read or written, once', async () => {
  const migrator = createMigrator(database);

  await migrator.up();
  const again = await migrator.up();

  expect(again).toEqual([]);
  expect(await tables()).toEqual([
    'audit_events',
    'charts',
    'claims',
    'comparisons',
    'copies',
    'copy_questions',
    'copy_rooms',
    'copy_views',
    'editions',
    'events',
    'fights',
    'files',
    'instruments',
    'invitations',
    'leak_answers',
    'leak_marks',
    'margin_notes',
    'memberships',
    'migrations',
    'models',
    'note_replies',
    'outbox',
    'problems',
    'quantities',
    'report_docs',
    'report_updates',
    'series',
    'sessions',
    'tasks',
    'teams',
    'tokens',
    'trials',
    'users',
  ]);
});

test('migrations, when run down to the start and up again: leave nothing behind and work anew', async () => {
  const migrator = createMigrator(database);
  await migrator.up();
  const all = await tables();

  await migrator.down({ to: 0 });
  const left = await tables();
  await migrator.up();

  expect(left).toEqual(['migrations']);
  expect(await tables()).toEqual(all);
});

test.each(['the standing connection', 'the connection of a transaction'])(
  'settings, on %s: write-ahead log, full synchronisation, foreign keys',
  async (which) => {
    const read = async (name: string, transaction?: Parameters<Parameters<Database['read']>[0]>[0]) => {
      const [row] = await database.sequelize.query<Record<string, unknown>>(`PRAGMA ${name}`, {
        type: QueryTypes.SELECT,
        ...(transaction ? { transaction } : {}),
      });
      return Object.values(row ?? {})[0];
    };
    const readAll = async (transaction?: Parameters<typeof read>[1]) => [
      await read('journal_mode', transaction),
      await read('synchronous', transaction),
      await read('foreign_keys', transaction),
      await read('busy_timeout', transaction),
    ];

    const settings = which.includes('transaction') ? await database.read(readAll) : await readAll();

    expect(settings).toEqual(['wal', 2, 1, 10_000]);
  },
);

test('write, when fifty are asked for at once: all succeed, one after the other', async () => {
  await database.sequelize.query('CREATE TABLE counter (value INTEGER NOT NULL)');
  await database.sequelize.query('INSERT INTO counter VALUES (0)');

  await Promise.all(
    Array.from({ length: 50 }, () =>
      database.write(async (transaction) => {
        const [row] = await database.sequelize.query<{ value: number }>('SELECT value FROM counter', {
          type: QueryTypes.SELECT,
          transaction,
        });
        await database.sequelize.query(`UPDATE counter SET value = ${(row?.value ?? 0) + 1}`, {
          transaction,
        });
      }),
    ),
  );

  expect(await select('SELECT value FROM counter')).toEqual([{ value: 50 }]);
});

test('write, when its work fails: nothing of it is kept, nobody is told, and the next write goes on', async () => {
  await database.sequelize.query('CREATE TABLE note (text TEXT)');
  const told: string[] = [];

  const failing = database.write(
    async (transaction) => {
      await database.sequelize.query("INSERT INTO note VALUES ('half')", { transaction });
      throw new Error('no further');
    },
    () => told.push('failing'),
  );
  const next = database.write(
    (transaction) => database.sequelize.query("INSERT INTO note VALUES ('whole')", { transaction }),
    () => told.push('next'),
  );

  await expect(failing).rejects.toThrow('no further');
  await next;
  expect(await select('SELECT text FROM note')).toEqual([{ text: 'whole' }]);
  expect(told).toEqual(['next']);
});

test('read, when something is written meanwhile: sees one and the same state throughout', async () => {
  await database.sequelize.query('CREATE TABLE note (text TEXT)');

  const counts = await database.read(async (transaction) => {
    const count = async () => {
      const rows = await database.sequelize.query('SELECT text FROM note', {
        type: QueryTypes.SELECT,
        transaction,
      });
      return rows.length;
    };
    const before = await count();
    await database.write((writing) =>
      database.sequelize.query("INSERT INTO note VALUES ('new')", { transaction: writing }),
    );
    return [before, await count()];
  });

  expect(counts).toEqual([0, 0]);
});
