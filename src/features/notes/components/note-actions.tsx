import { useRef, useState } from 'react';
import type { MarginNote } from '#shared/contracts/notes.ts';
import { isSettled } from '#shared/notes/note-states.ts';
import { Notice } from '#src/components/notice.tsx';
import { Word } from '#src/components/word.tsx';
import { sentenceOf } from '#src/lib/api/api-error.ts';
import { useProblem } from '#src/lib/problem/problem-context.ts';
import { useChangeNote } from '../api/change-notes.ts';
import { AnswerForm } from './answer-form.tsx';
import { SettleForm } from './settle-form.tsx';

/** Answer and Settle, or the lines in which that is done; a settled note can be opened again. */
export function NoteActions({ note }: { readonly note: MarginNote }) {
  const { address, role, mayWrite } = useProblem();
  const [doing, setDoing] = useState<'answer' | 'settle' | null>(null);
  const words = useRef<HTMLDivElement>(null);
  const open = useChangeNote(address);
  const done = () => {
    setDoing(null);
    // The word that was pressed is drawn again, or another in its place.
    requestAnimationFrame(() => words.current?.querySelector('button')?.focus());
  };
  const maySettle = role !== 'member';
  if (doing === 'answer') return <AnswerForm note={note} onDone={done} />;
  if (doing === 'settle') return <SettleForm note={note} onDone={done} />;
  return (
    <div ref={words} className="note-actions">
      {!isSettled(note.state) && mayWrite && (
        <Word aria-label={`Answer note ${note.n}`} onClick={() => setDoing('answer')}>
          Answer
        </Word>
      )}
      {!isSettled(note.state) && maySettle && (
        <Word aria-label={`Settle note ${note.n}`} onClick={() => setDoing('settle')}>
          Settle
        </Word>
      )}
      {isSettled(note.state) && maySettle && (
        <Word
          aria-label={`Open again note ${note.n}`}
          onClick={() => open.mutate({ note: note.id, change: { kind: 'open again' } })}
        >
          Open again
        </Word>
      )}
      {open.error && <Notice title="The note was not opened again.">{sentenceOf(open.error)}</Notice>}
    </div>
  );
}
