import type { Migration } from '../migration.ts';

export const fights: Migration = {
  name: '0011-fights',
  async up(run) {
    await run(`CREATE TABLE events (
      id TEXT PRIMARY KEY,
      team_id TEXT NOT NULL REFERENCES teams (id) ON DELETE CASCADE,
      content TEXT NOT NULL,
      row_version INTEGER NOT NULL DEFAULT 1
    )`);
    await run('CREATE INDEX events_by_team ON events (team_id)');
    await run('ALTER TABLE fights ADD COLUMN event_id TEXT');
    await run('ALTER TABLE fights ADD COLUMN row_version INTEGER NOT NULL DEFAULT 1');
  },
  async down(run) {
    await run('ALTER TABLE fights DROP COLUMN row_version');
    await run('ALTER TABLE fights DROP COLUMN event_id');
    await run('DROP TABLE events');
  },
};
