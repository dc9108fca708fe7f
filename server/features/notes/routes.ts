import type { Express } from 'express';
import {
  answerNote as answerNoteEndpoint,
  changeNote as changeNoteEndpoint,
  listNotes as listNotesEndpoint,
  writeNote as writeNoteEndpoint,
} from '#shared/contracts/notes.ts';
import type { ServerDeps } from '#server/deps.ts';
import { mountProblem } from '#server/middleware/mount.ts';
import { changeNote } from './change-note.ts';
import { answerNote, listNotes, writeNote } from './service.ts';

export function mountNotes(app: Express, deps: ServerDeps): void {
  const { database } = deps;

  mountProblem(app, database, listNotesEndpoint, 'read', ({ place }) =>
    listNotes(database, place.problem.id),
  );

  mountProblem(app, database, writeNoteEndpoint, 'advise', ({ place, actor, body }) =>
    writeNote(deps, place, actor, body),
  );

  mountProblem(app, database, answerNoteEndpoint, 'write', ({ place, actor, param, body }) =>
    answerNote(deps, place, actor, { note: param('note'), ...body }),
  );

  // Who may make which change is not the same for all of them: the service decides.
  mountProblem(app, database, changeNoteEndpoint, 'read', ({ place, actor, param, body }) =>
    changeNote(deps, place, actor, param('note'), body),
  );
}
