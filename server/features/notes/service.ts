/** Margin notes: kept beside the report. No function here touches the report's text. */
import type { Transaction } from 'sequelize';
import type { z } from 'zod';
import type {
  answerNote as answerNoteEndpoint,
  MarginNote,
  writeNote as writeNoteEndpoint,
} from '#shared/contracts/notes.ts';
import { isSettled } from '#shared/notes/note-states.ts';
import type { Database } from '#server/database/database.ts';
import type { ServerDeps } from '#server/deps.ts';
import { AppError } from '#server/errors/app-error.ts';
import { notFound } from '#server/errors/refusals.ts';
import type { ProblemPlace } from '#server/features/teams/service.ts';
import type { Actor } from '#server/middleware/actor.ts';
import { toMarginNote, type MarginNoteModel, type NoteReplyModel } from './model.ts';

/** A team that has this many notes on one problem needs a conversation, not another note. */
const MAX_NOTES = 400;
const MAX_ANSWERS = 40;

/** A problem's notes by number, each with its answers. */
export async function listNotes(database: Database, problemId: string): Promise<MarginNote[]> {
  const rows = await database.models.marginNotes.findAll({
    where: { problemId },
    order: [['n', 'ASC']],
    raw: true,
  });
  return withAnswers(database, rows);
}

/** Writes a note; the same note sent again by the same person is the note that is there. */
export async function writeNote(
  deps: ServerDeps,
  place: ProblemPlace,
  actor: Actor,
  { id, section, anchor, text }: z.infer<typeof writeNoteEndpoint.body>,
): Promise<MarginNote> {
  const { marginNotes } = deps.database.models;
  const problemId = place.problem.id;
  const isNew = await deps.database.write(async (transaction) => {
    const there = await marginNotes.findByPk(id, { raw: true, transaction });
    if (there) {
      if (there.userId !== actor.id || there.problemId !== problemId) throw idTaken();
      return false;
    }
    const last = (await marginNotes.max('n', { where: { problemId }, transaction })) as number | null;
    if ((last ?? 0) >= MAX_NOTES) {
      throw new AppError(
        422,
        'too-many-notes',
        `There are ${MAX_NOTES} notes on this problem. Settle some by word of mouth.`,
      );
    }
    await marginNotes.create(
      {
        id,
        problemId,
        n: (last ?? 0) + 1,
        section,
        anchor: JSON.stringify(anchor),
        text,
        by: actor.name,
        userId: actor.id,
        at: deps.now().toISOString(),
        state: 'open',
        reason: '',
        settledBy: null,
        settledAt: null,
        revision: 0,
      },
      { transaction },
    );
    await auditNote(
      deps,
      place,
      actor,
      { action: 'write a margin note', id, before: null, after: 'open' },
      transaction,
    );
    return true;
  });
  if (isNew) tellOfNotes(deps, place);
  return getNote(deps.database, problemId, id);
}

/** Answers a note that is not settled. */
export async function answerNote(
  deps: ServerDeps,
  place: ProblemPlace,
  actor: Actor,
  { note, id, text }: z.infer<typeof answerNoteEndpoint.body> & { readonly note: string },
): Promise<MarginNote> {
  const { marginNotes, noteReplies } = deps.database.models;
  await deps.database.write(async (transaction) => {
    const row = await findNote(deps.database, place.problem.id, note, transaction);
    const there = await noteReplies.findByPk(id, { raw: true, transaction });
    if (there) {
      if (there.userId !== actor.id || there.noteId !== note) throw idTaken();
      return;
    }
    if (isSettled(row.state)) throw settledMeanwhile(row);
    if ((await noteReplies.count({ where: { noteId: note }, transaction })) >= MAX_ANSWERS) {
      throw new AppError(
        422,
        'too-many-answers',
        `Note ${row.n} has ${MAX_ANSWERS} answers. Talk to ${row.by}, then settle it.`,
      );
    }
    const at = deps.now().toISOString();
    await noteReplies.create(
      { id, noteId: note, text, by: actor.name, userId: actor.id, at },
      { transaction },
    );
    await marginNotes.update({ state: 'answered' }, { where: { id: note }, transaction });
    await auditNote(
      deps,
      place,
      actor,
      { action: 'answer a margin note', id: note, before: row.state, after: 'answered' },
      transaction,
    );
  });
  tellOfNotes(deps, place);
  return getNote(deps.database, place.problem.id, note);
}

export async function getNote(database: Database, problemId: string, id: string): Promise<MarginNote> {
  const [note] = await withAnswers(database, [await findNote(database, problemId, id)]);
  if (!note) throw notFound();
  return note;
}

/** The row of a note of this problem; 404 for any other. */
export async function findNote(
  database: Database,
  problemId: string,
  id: string,
  transaction?: Transaction,
): Promise<MarginNoteModel> {
  const row = await database.models.marginNotes.findOne({
    where: { id, problemId },
    raw: true,
    ...(transaction ? { transaction } : {}),
  });
  if (!row) throw notFound('There is no such note beside this report.');
  return row;
}

export function settledMeanwhile({ n, settledBy }: MarginNoteModel): AppError {
  return new AppError(
    409,
    'settled',
    `Note ${n} was settled by ${settledBy ?? 'somebody'} meanwhile. Open it again if there is more to say.`,
  );
}

export function tellOfNotes(deps: ServerDeps, place: ProblemPlace): void {
  deps.events.publishStale(place, 'notes', place.problem.number);
}

export async function auditNote(
  deps: ServerDeps,
  place: ProblemPlace,
  actor: Actor,
  what: {
    readonly action: string;
    readonly id: string;
    readonly before: string | null;
    readonly after: string;
  },
  transaction: Transaction,
): Promise<void> {
  const line = (state: string | null) => JSON.stringify([{ table: 'margin_notes', id: what.id, state }]);
  await deps.database.models.auditEvents.create(
    {
      teamId: place.team.id,
      problemId: place.problem.id,
      version: null,
      mutationId: null,
      userId: actor.id,
      at: deps.now().toISOString(),
      action: what.action,
      before: line(what.before),
      changes: line(what.after),
    },
    { transaction },
  );
}

async function withAnswers(database: Database, rows: readonly MarginNoteModel[]): Promise<MarginNote[]> {
  const replies = await database.models.noteReplies.findAll({
    where: { noteId: rows.map(({ id }) => id) },
    order: [
      ['at', 'ASC'],
      ['id', 'ASC'],
    ],
    raw: true,
  });
  const byNote = new Map<string, NoteReplyModel[]>();
  for (const reply of replies) byNote.set(reply.noteId, [...(byNote.get(reply.noteId) ?? []), reply]);
  return rows.map((row) => toMarginNote(row, byNote.get(row.id) ?? []));
}

function idTaken(): AppError {
  return new AppError(
    409,
    'id-taken',
    'There is something else under this id. Load the page again and write it once more.',
  );
}
