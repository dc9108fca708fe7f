import type { Migration } from '../migration.ts';

export const notes: Migration = {
  name: '0007-notes',
  async up(run) {
    // Beside the document and not in it: who writes a note needs no right to write the text.
    await run(`CREATE TABLE margin_notes (
      id TEXT PRIMARY KEY,
      problem_id TEXT NOT NULL REFERENCES problems (id) ON DELETE CASCADE,
      n INTEGER NOT NULL,
      section TEXT NOT NULL,
      anchor TEXT NOT NULL,
      text TEXT NOT NULL,
      by TEXT NOT NULL,
      user_id TEXT NOT NULL REFERENCES users (id),
      at TEXT NOT NULL,
      state TEXT NOT NULL CHECK (state IN ('open', 'answered', 'agreed', 'held to')),
      reason TEXT NOT NULL,
      settled_by TEXT,
      settled_at TEXT,
      revision INTEGER NOT NULL,
      UNIQUE (problem_id, n)
    )`);
    await run(`CREATE TABLE note_replies (
      id TEXT PRIMARY KEY,
      note_id TEXT NOT NULL REFERENCES margin_notes (id) ON DELETE CASCADE,
      text TEXT NOT NULL,
      by TEXT NOT NULL,
      user_id TEXT NOT NULL REFERENCES users (id),
      at TEXT NOT NULL
    )`);
    await run('CREATE INDEX note_replies_note ON note_replies (note_id)');
  },
  async down(run) {
    for (const table of ['note_replies', 'margin_notes']) await run(`DROP TABLE ${table}`);
  },
};
