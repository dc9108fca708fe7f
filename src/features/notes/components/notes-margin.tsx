import '../notes.css';
import { useQuery } from '@tanstack/react-query';
import type { Editor } from '@tiptap/react';
import { useRef, type RefObject } from 'react';
import { createPortal } from 'react-dom';
import type { MarginNote } from '#shared/contracts/notes.ts';
import { Notice } from '#src/components/notice.tsx';
import { Word } from '#src/components/word.tsx';
import { sentenceOf } from '#src/lib/api/api-error.ts';
import { useProblem } from '#src/lib/problem/problem-context.ts';
import { useMedia } from '#src/lib/use-media.ts';
import { notesQuery } from '../api/list-notes.ts';
import type { NoteDesk } from '../view/note-desk.ts';
import { useNoteStack } from '../view/use-note-stack.ts';
import { useStandingNotes } from '../view/use-standing-notes.ts';
import { useWritePlaces } from '../view/use-write-places.ts';
import { NewNote } from './new-note.tsx';
import { NoteLines } from './note-lines.tsx';

const NO_NOTES: readonly MarginNote[] = [];

interface NotesMarginProps {
  readonly desk: NoteDesk;
  readonly editor: Editor;
  readonly page: RefObject<HTMLElement | null>;
}

/** The page's margin: each note beside its words, or after their paragraph where there is no margin. */
export function NotesMargin({ desk, editor, page }: NotesMarginProps) {
  const { address, role } = useProblem();
  const { data = NO_NOTES, error, refetch } = useQuery(notesQuery(address));
  const margin = useRef<HTMLElement>(null);
  const isInText = useMedia('(max-width: 1100px)');
  const standing = useStandingNotes(editor, data, isInText);
  useNoteStack(editor, page, margin, isInText);
  useWritePlaces(editor, desk);
  return (
    <aside ref={margin} className="note-margin" aria-label="Margin notes">
      {error && (
        <div className="note-failure" data-note="failure">
          <Notice title="The notes could not be loaded.">
            {sentenceOf(error)} <Word onClick={() => void refetch()}>Try again</Word>
          </Notice>
        </div>
      )}
      {role === 'advisor' && <NewNote editor={editor} />}
      {isInText
        ? standing.map(({ note, isGone }) =>
            createPortal(<NoteLines note={note} isGone={isGone} />, desk.hostOf(note.id), note.id),
          )
        : standing.length > 0 && (
            <ol>
              {standing.map(({ note, isGone }) => (
                <li key={note.id} data-note={note.id} data-section={note.section}>
                  <NoteLines note={note} isGone={isGone} />
                </li>
              ))}
            </ol>
          )}
    </aside>
  );
}
