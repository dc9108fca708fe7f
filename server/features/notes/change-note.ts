import type { MarginNote, NoteChange } from '#shared/contracts/notes.ts';
import { noteAnchorSchema, type TextPlace } from '#shared/notes/note-anchor.ts';
import { isSettled, stateWithout } from '#shared/notes/note-states.ts';
import type { ServerDeps } from '#server/deps.ts';
import { changedMeanwhile, invalid, notAllowed } from '#server/errors/refusals.ts';
import type { ProblemPlace } from '#server/features/teams/service.ts';
import type { Actor } from '#server/middleware/actor.ts';
import { auditNote, findNote, getNote, settledMeanwhile, tellOfNotes } from './service.ts';

/** Settles a note, opens it again, or writes anew where its words stand; each to those who may. */
export async function changeNote(
  deps: ServerDeps,
  place: ProblemPlace,
  actor: Actor,
  id: string,
  change: NoteChange,
): Promise<MarginNote> {
  if (change.kind === 'place') await placeNote(deps, place, id, change);
  else await settleNote(deps, place, actor, id, change);
  tellOfNotes(deps, place);
  return getNote(deps.database, place.problem.id, id);
}

async function settleNote(
  deps: ServerDeps,
  place: ProblemPlace,
  actor: Actor,
  id: string,
  change: Exclude<NoteChange, { kind: 'place' }>,
): Promise<void> {
  if (place.role === 'member')
    throw notAllowed('The advisor or the captain settles a note; members answer it.');
  const { marginNotes, noteReplies } = deps.database.models;
  await deps.database.write(async (transaction) => {
    const row = await findNote(deps.database, place.problem.id, id, transaction);
    if (change.kind === 'open again') {
      const answers = await noteReplies.count({ where: { noteId: id }, transaction });
      const state = stateWithout(answers);
      const fresh = { state, reason: '', settledBy: null, settledAt: null };
      await marginNotes.update(fresh, { where: { id }, transaction });
      await auditNote(
        deps,
        place,
        actor,
        { action: 'open a margin note again', id, before: row.state, after: state },
        transaction,
      );
      return;
    }
    if (isSettled(row.state)) throw settledMeanwhile(row);
    const state = change.kind === 'agree' ? 'agreed' : 'held to';
    const reason = change.kind === 'agree' ? '' : change.reason;
    const settledAt = deps.now().toISOString();
    await marginNotes.update(
      { state, reason, settledBy: actor.name, settledAt },
      { where: { id }, transaction },
    );
    await auditNote(
      deps,
      place,
      actor,
      { action: 'settle a margin note', id, before: row.state, after: state },
      transaction,
    );
  });
}

/** Compare and set: of two editors who place a note at the same time, the second looks again. What it quotes stays. */
async function placeNote(
  deps: ServerDeps,
  place: ProblemPlace,
  id: string,
  { place: next, revision }: { readonly place: TextPlace; readonly revision: number },
): Promise<void> {
  if (place.role === 'advisor')
    throw notAllowed('A note follows the text by itself; the team places it anew.');
  await deps.database.write(async (transaction) => {
    const row = await findNote(deps.database, place.problem.id, id, transaction);
    const anchor = noteAnchorSchema.parse(JSON.parse(row.anchor));
    if (anchor.kind !== 'text')
      throw invalid({ place: `Note ${row.n} is about ${anchor.said} and follows it.` });
    if (row.revision !== revision) throw changedMeanwhile();
    await deps.database.models.marginNotes.update(
      { anchor: JSON.stringify({ ...anchor, ...next }), revision: revision + 1 },
      { where: { id }, transaction },
    );
  });
}
