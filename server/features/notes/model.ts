import { DataTypes } from 'sequelize';
import type { InferAttributes, InferCreationAttributes, Model, Sequelize } from 'sequelize';
import type { MarginNote, NoteReply } from '#shared/contracts/notes.ts';
import { noteAnchorSchema } from '#shared/notes/note-anchor.ts';
import type { NoteState } from '#shared/notes/note-states.ts';
import type { SectionName } from '#shared/report/schema/section-type.ts';

/** A margin note. */
export interface MarginNoteModel extends Model<
  InferAttributes<MarginNoteModel>,
  InferCreationAttributes<MarginNoteModel>
> {
  id: string;
  problemId: string;
  n: number;
  section: SectionName;
  /** JSON of a NoteAnchor. */
  anchor: string;
  text: string;
  /** Name of who wrote it, as it was then. */
  by: string;
  userId: string;
  at: string;
  state: NoteState;
  reason: string;
  settledBy: string | null;
  settledAt: string | null;
  revision: number;
}

export function defineMarginNotes(sequelize: Sequelize) {
  return sequelize.define<MarginNoteModel>('margin_notes', {
    id: { type: DataTypes.STRING, primaryKey: true },
    problemId: DataTypes.STRING,
    n: DataTypes.INTEGER,
    section: DataTypes.STRING,
    anchor: DataTypes.TEXT,
    text: DataTypes.TEXT,
    by: DataTypes.STRING,
    userId: DataTypes.STRING,
    at: DataTypes.STRING,
    state: DataTypes.STRING,
    reason: DataTypes.TEXT,
    settledBy: DataTypes.STRING,
    settledAt: DataTypes.STRING,
    revision: DataTypes.INTEGER,
  });
}

/** What the team says to a note. */
export interface NoteReplyModel extends Model<
  InferAttributes<NoteReplyModel>,
  InferCreationAttributes<NoteReplyModel>
> {
  id: string;
  noteId: string;
  text: string;
  by: string;
  userId: string;
  at: string;
}

export function defineNoteReplies(sequelize: Sequelize) {
  return sequelize.define<NoteReplyModel>('note_replies', {
    id: { type: DataTypes.STRING, primaryKey: true },
    noteId: DataTypes.STRING,
    text: DataTypes.TEXT,
    by: DataTypes.STRING,
    userId: DataTypes.STRING,
    at: DataTypes.STRING,
  });
}

export function toMarginNote(row: MarginNoteModel, replies: readonly NoteReplyModel[]): MarginNote {
  const { id, n, section, text, by, at, state, reason, settledBy, settledAt, revision } = row;
  return {
    id,
    n,
    section,
    anchor: noteAnchorSchema.parse(JSON.parse(row.anchor)),
    text,
    by,
    at,
    state,
    settled: settledBy === null || settledAt === null ? null : { by: settledBy, at: settledAt, reason },
    revision,
    answers: replies.map(toNoteReply),
  };
}

function toNoteReply({ id, text, by, at }: NoteReplyModel): NoteReply {
  return { id, text, by, at };
}
