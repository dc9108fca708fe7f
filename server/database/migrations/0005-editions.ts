import type { Migration } from '../migration.ts';

/** Columns that are written once; the PDF may come later, and then stays too. */
const WRITTEN_ONCE = [
  'id',
  'problem_id',
  'n',
  'frozen_at',
  'frozen_by',
  'user_id',
  'note',
  'seal',
  'schema_version',
  'trials',
  'tied_numbers',
  'content',
];

export const editions: Migration = {
  name: '0005-editions',
  async up(run) {
    // No cascade: while a copy of it may be out with another team, an edition does not go.
    await run(`CREATE TABLE editions (
      id TEXT PRIMARY KEY,
      problem_id TEXT NOT NULL REFERENCES problems (id),
      n INTEGER NOT NULL CHECK (n > 0),
      frozen_at TEXT NOT NULL,
      frozen_by TEXT NOT NULL,
      user_id TEXT NOT NULL REFERENCES users (id),
      note TEXT NOT NULL,
      seal TEXT NOT NULL,
      schema_version INTEGER NOT NULL,
      trials INTEGER NOT NULL,
      tied_numbers INTEGER NOT NULL,
      content TEXT NOT NULL,
      pages INTEGER,
      pdf_sha TEXT,
      pdf BLOB,
      UNIQUE (problem_id, n)
    )`);
    const changed = WRITTEN_ONCE.map((column) => `NEW.${column} IS NOT OLD.${column}`).join(' OR ');
    await run(`CREATE TRIGGER editions_stay_as_they_are BEFORE UPDATE ON editions
      WHEN OLD.pdf IS NOT NULL OR ${changed}
      BEGIN SELECT RAISE(ABORT, 'an edition is never changed'); END`);
    await run(`CREATE TRIGGER editions_stay BEFORE DELETE ON editions
      BEGIN SELECT RAISE(ABORT, 'an edition is never removed'); END`);
  },
  async down(run) {
    await run('DROP TABLE editions');
  },
};
