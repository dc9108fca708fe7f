import type { Editor } from '@tiptap/react';
import { useCallback, useState, useSyncExternalStore } from 'react';
import type { ReportDocument } from '#shared/report/schema/report-node.ts';
import { Word } from '#src/components/word.tsx';
import { useEvidence } from '#src/lib/evidence/use-evidence.ts';
import { blockChoices, type BlockChoice } from '../view/block-choices.ts';
import { hasSelected, selectedSubject, type NoteSubject } from '../view/note-subject.ts';
import { NewNoteForm } from './new-note-form.tsx';

interface Writing {
  readonly selected: NoteSubject | null;
  readonly blocks: readonly BlockChoice[];
  /** Position beside which it is written; null: at the head of the margin. */
  readonly at: number | null;
}

/** The advisor's word for writing a note, beside what is selected; and the lines in which it is written. */
export function NewNote({ editor }: { readonly editor: Editor }) {
  const evidence = useEvidence();
  const selected = useSelectedFrom(editor);
  const [writing, setWriting] = useState<Writing | null>(null);
  const begin = () => {
    const blocks = blockChoices(editor.getJSON() as ReportDocument, evidence);
    setWriting({ selected: selectedSubject(editor.view, blocks), blocks, at: selected });
  };
  const at = writing ? writing.at : selected;
  return (
    <div className="note-new" data-note="new" {...(at === null ? {} : { 'data-at': at })}>
      {writing ? (
        <NewNoteForm
          editor={editor}
          selected={writing.selected}
          blocks={writing.blocks}
          onDone={() => setWriting(null)}
        />
      ) : (
        // The selection must outlive the press.
        <Word className="text-sm" onMouseDown={(event) => event.preventDefault()} onClick={begin}>
          {selected === null ? 'Write a note' : 'Write a note on this'}
        </Word>
      )}
    </div>
  );
}

function useSelectedFrom(editor: Editor): number | null {
  const subscribe = useCallback(
    (listener: () => void) => {
      editor.on('transaction', listener);
      return () => void editor.off('transaction', listener);
    },
    [editor],
  );
  return useSyncExternalStore(subscribe, () =>
    hasSelected(editor.state) ? editor.state.selection.from : null,
  );
}
