import type { Editor } from '@tiptap/react';
import { useEffect } from 'react';
import type { NoteChange } from '#shared/contracts/notes.ts';
import type { TextPlace } from '#shared/notes/note-anchor.ts';
import { useProblem } from '#src/lib/problem/problem-context.ts';
import { useChangeNote } from '../api/change-notes.ts';
import { notesIn } from '../plugin/margin-notes.ts';
import type { NoteDesk } from './note-desk.ts';
import { textPlaceOf } from './text-place.ts';

const AFTER_MS = 1_200;

/** After own edits, keeps where the notes stand now: splitting a paragraph makes new text of old words. */
export function useWritePlaces(editor: Editor, { ownEdits }: NoteDesk): void {
  const { address, mayWrite } = useProblem();
  const { mutate } = useChangeNote(address);
  useEffect(() => {
    if (!mayWrite) return undefined;
    let timer: ReturnType<typeof setTimeout> | undefined;
    const stop = ownEdits.subscribe(() => {
      clearTimeout(timer);
      timer = setTimeout(() => {
        // Somebody else may have been first; then theirs is as good.
        for (const moved of movedNotes(editor)) mutate(moved);
      }, AFTER_MS);
    });
    return () => {
      stop();
      clearTimeout(timer);
    };
  }, [editor, ownEdits, mayWrite, mutate]);
}

function movedNotes(editor: Editor): readonly { note: string; change: NoteChange }[] {
  if (editor.isDestroyed) return [];
  const { notes, places } = notesIn(editor.state);
  return notes.flatMap(({ id, anchor, section, revision }) => {
    const range = places.get(id);
    if (anchor.kind === 'block' || !range) return [];
    const place = textPlaceOf(editor.state, section, range)?.place;
    if (!place || isSame(place, anchor)) return [];
    return [{ note: id, change: { kind: 'place', place, revision } }];
  });
}

function isSame(a: TextPlace, b: TextPlace): boolean {
  return a.from === b.from && a.to === b.to && a.before === b.before && a.after === b.after;
}
