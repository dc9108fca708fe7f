import { Extension } from '@tiptap/core';
import { Plugin, PluginKey, type EditorState, type Transaction } from '@tiptap/pm/state';
import type { DecorationSet } from '@tiptap/pm/view';
import { ySyncPluginKey } from '@tiptap/y-tiptap';
import type { MarginNote } from '#shared/contracts/notes.ts';
import type { Span } from '#shared/notes/find-quote.ts';
import { drawMarks } from './draw-marks.ts';
import { findPlace, sectionReader } from './find-place.ts';
import { LatestPlaces } from './latest-places.ts';
import { positionsIn } from './positions.ts';

/** The notes of an open report, and where each stands. */
export interface NotesState {
  readonly notes: readonly MarginNote[];
  /** null: what it was about is gone. */
  readonly places: ReadonlyMap<string, Span | null>;
  /** Nothing may be called gone before the text is there. */
  readonly isReady: boolean;
  /** Notes follow their paragraphs, as there is no margin. */
  readonly isInText: boolean;
  /** The last change of the text was made in this window. */
  readonly isOwnEdit: boolean;
  readonly marks: DecorationSet | null;
}

interface MarginNotesOptions {
  readonly hostOf: (note: string) => HTMLElement;
  /** The text was changed in this window. */
  readonly onOwnEdit: () => void;
}

interface Told {
  readonly notes: readonly MarginNote[];
  readonly isInText: boolean;
}

const NONE: NotesState = {
  notes: [],
  places: new Map(),
  isReady: false,
  isInText: false,
  isOwnEdit: false,
  marks: null,
};

const key = new PluginKey<NotesState>('margin notes');

export function notesIn(state: EditorState): NotesState {
  return key.getState(state) ?? NONE;
}

/** Tells the plugin which notes there are, and how they are shown. */
export function tellNotes(state: EditorState, told: Told): Transaction {
  return state.tr.setMeta(key, told).setMeta('addToHistory', false);
}

/** Follows what notes are about while the text is edited, here and elsewhere. It never changes the text. */
export const MarginNotes = Extension.create<MarginNotesOptions>({
  name: 'marginNotes',
  // After the co-editing, whose positions it reads.
  priority: 10,
  addOptions: () => ({ hostOf: () => document.createElement('div'), onOwnEdit: () => undefined }),
  addProseMirrorPlugins() {
    const { hostOf, onOwnEdit } = this.options;
    const latest = new LatestPlaces();
    const follow = (tr: Transaction, before: NotesState, state: EditorState): NotesState => {
      const told = tr.getMeta(key) as Told | undefined;
      const fromElsewhere = tr.getMeta(ySyncPluginKey) !== undefined;
      if (!told && !tr.docChanged && !fromElsewhere) return before;
      const { notes, isInText } = told ?? before;
      const isOwnEdit = tr.docChanged && !fromElsewhere;
      const places = isOwnEdit ? mapped(tr, before) : resolved(notes, state, latest);
      const hosts = isInText ? hostOf : null;
      return {
        notes,
        places,
        isInText,
        isOwnEdit: tr.docChanged ? isOwnEdit : before.isOwnEdit,
        isReady: positionsIn(state) !== null,
        marks: drawMarks(tr.doc, notes, places, hosts),
      };
    };
    return [
      new Plugin<NotesState>({
        key,
        state: { init: () => NONE, apply: (tr, before, _old, state) => follow(tr, before, state) },
        props: { decorations: (state) => key.getState(state)?.marks },
        view: () => ({
          update({ state }, { doc }) {
            const now = notesIn(state);
            if (!now.isOwnEdit || state.doc === doc) return;
            latest.remember(now, state);
            onOwnEdit();
          },
        }),
      }),
    ];
  },
});

/** Own edits are mapped: the co-edited text learns of them only afterwards. */
function mapped(
  { doc, mapping }: Transaction,
  { notes, places }: NotesState,
): ReadonlyMap<string, Span | null> {
  const sectionOf = sectionReader(doc);
  return new Map(
    notes.map((note) => {
      const place = places.get(note.id);
      const candidate = place ? { from: mapping.map(place.from, 1), to: mapping.map(place.to, -1) } : null;
      return [note.id, findPlace(note, doc, sectionOf, candidate)];
    }),
  );
}

/** What others write replaces the whole document: every place is found again by its lasting positions. */
function resolved(
  notes: readonly MarginNote[],
  state: EditorState,
  latest: LatestPlaces,
): ReadonlyMap<string, Span | null> {
  const positions = positionsIn(state);
  const sectionOf = sectionReader(state.doc);
  return new Map(
    notes.map((note) => {
      const ends = latest.endsOf(note);
      const from = ends && positions ? positions.toAbsolute(ends.from) : null;
      const to = ends && positions ? positions.toAbsolute(ends.to) : null;
      const candidate = from === null || to === null ? null : { from, to };
      return [note.id, findPlace(note, state.doc, sectionOf, candidate)];
    }),
  );
}
