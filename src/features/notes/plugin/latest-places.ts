import type { EditorState } from '@tiptap/pm/state';
import type { MarginNote } from '#shared/contracts/notes.ts';
import type { NotesState } from './margin-notes.ts';
import { positionsIn } from './positions.ts';

interface Ends {
  readonly from: string;
  readonly to: string;
}

/** Lasting positions as they are after this window's own edits, until the server has them. */
export class LatestPlaces {
  readonly #ends = new Map<string, Ends & { readonly revision: number }>();

  /** Where a note about words begins and ends; null for a note about a block. */
  endsOf({ id, anchor, revision }: MarginNote): Ends | null {
    if (anchor.kind === 'block') return null;
    const own = this.#ends.get(id);
    return own?.revision === revision ? own : anchor;
  }

  remember({ notes, places }: NotesState, state: EditorState): void {
    const positions = positionsIn(state);
    if (!positions) return;
    for (const { id, anchor, revision } of notes) {
      const place = places.get(id);
      if (anchor.kind === 'block' || !place) continue;
      const ends = { from: positions.toRelative(place.from), to: positions.toRelative(place.to) };
      this.#ends.set(id, { ...ends, revision });
    }
  }
}
