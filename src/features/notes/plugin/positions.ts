import {
  absolutePositionToRelativePosition,
  relativePositionToAbsolutePosition,
  ySyncPluginKey,
  type ProsemirrorBinding,
} from '@tiptap/y-tiptap';
import type { EditorState } from '@tiptap/pm/state';
import { fromBase64, toBase64 } from 'lib0/buffer';
import * as Y from 'yjs';

/** Positions of the open document as the co-edited text knows them: they survive what others write. */
export interface Positions {
  /** null when what stood there is gone. */
  toAbsolute(position: string): number | null;
  toRelative(position: number): string;
}

interface SyncState {
  readonly doc: Y.Doc;
  readonly type: Y.XmlFragment;
  readonly binding: ProsemirrorBinding | null;
}

/** Positions in a state; null until the co-edited text is drawn. */
export function positionsIn(state: EditorState): Positions | null {
  const sync = ySyncPluginKey.getState(state) as SyncState | undefined;
  const binding = sync?.binding;
  if (!binding || binding.mapping.size === 0) return null;
  const { doc, type } = sync;
  return {
    toAbsolute(position) {
      try {
        const relative = Y.decodeRelativePosition(fromBase64(position));
        return relativePositionToAbsolutePosition(doc, type, relative, binding.mapping);
      } catch {
        // A position that cannot be read is as good as none: the words are then looked for by what they say.
        return null;
      }
    },
    toRelative(position) {
      const relative = absolutePositionToRelativePosition(
        position,
        type,
        binding.mapping,
      ) as Y.RelativePosition;
      return toBase64(Y.encodeRelativePosition(relative));
    },
  };
}
