import type { Extensions } from '@tiptap/core';
import { createStore, type Store } from '#src/lib/store/create-store.ts';
import { MarginNotes } from '../plugin/margin-notes.ts';

/** What a report's editor and its margin share. */
export interface NoteDesk {
  /** For the editor; made once. */
  readonly extensions: Extensions;
  /** Where a note is drawn when it follows its paragraph. */
  readonly hostOf: (note: string) => HTMLElement;
  /** Counts the edits made in this window. */
  readonly ownEdits: Store<number>;
}

export function createNoteDesk(): NoteDesk {
  const hosts = new Map<string, HTMLElement>();
  const ownEdits = createStore(0);
  const hostOf = (note: string) => {
    const host = hosts.get(note) ?? document.createElement('div');
    host.className = 'note-host';
    host.contentEditable = 'false';
    hosts.set(note, host);
    return host;
  };
  const onOwnEdit = () => ownEdits.set(ownEdits.get() + 1);
  return { extensions: [MarginNotes.configure({ hostOf, onOwnEdit })], hostOf, ownEdits };
}
