import type { Editor } from '@tiptap/react';
import { useCallback, useEffect, useMemo, useSyncExternalStore } from 'react';
import type { MarginNote } from '#shared/contracts/notes.ts';
import { notesIn, tellNotes } from '../plugin/margin-notes.ts';

export interface StandingNote {
  readonly note: MarginNote;
  /** What it was about is not in the text any more. */
  readonly isGone: boolean;
}

/** The notes in the order in which they stand beside the text; drawn again only when that order or a loss changes. */
export function useStandingNotes(
  editor: Editor,
  notes: readonly MarginNote[],
  isInText: boolean,
): readonly StandingNote[] {
  useEffect(() => {
    if (!editor.isDestroyed) editor.view.dispatch(tellNotes(editor.state, { notes, isInText }));
  }, [editor, notes, isInText]);
  const subscribe = useCallback(
    (listener: () => void) => {
      editor.on('transaction', listener);
      return () => void editor.off('transaction', listener);
    },
    [editor],
  );
  const order = useSyncExternalStore(subscribe, () => orderOf(editor));
  return useMemo(() => {
    const known = new Map(notes.map((note) => [note.id, note]));
    const standing = order.split(' ').flatMap((entry) => {
      const note = known.get(entry.slice(1));
      known.delete(entry.slice(1));
      return note ? [{ note, isGone: entry.startsWith('-') }] : [];
    });
    return [...standing, ...[...known.values()].map((note) => ({ note, isGone: false }))];
  }, [notes, order]);
}

/** "+id" for a note that stands, "-id" for one whose words are gone. */
function orderOf(editor: Editor): string {
  const { notes, places, isReady } = notesIn(editor.state);
  return [...notes]
    .sort((a, b) => (places.get(a.id)?.from ?? Infinity) - (places.get(b.id)?.from ?? Infinity) || a.n - b.n)
    .map(({ id }) => `${isReady && !places.get(id) ? '-' : '+'}${id}`)
    .join(' ');
}
