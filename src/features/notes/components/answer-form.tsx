import { useState } from 'react';
import type { MarginNote } from '#shared/contracts/notes.ts';
import { useProblem } from '#src/lib/problem/problem-context.ts';
import { useAnswerNote } from '../api/change-notes.ts';
import { NoteForm } from './note-form.tsx';

export function AnswerForm({ note, onDone }: { readonly note: MarginNote; readonly onDone: () => void }) {
  const { address } = useProblem();
  const [id] = useState(() => crypto.randomUUID());
  const answer = useAnswerNote(address, note.id);
  return (
    <NoteForm
      label={`Our answer to note ${note.n}`}
      action="Answer note"
      failed="The answer was not kept."
      error={answer.error}
      isPending={answer.isPending}
      onSend={(text) => answer.mutate({ id, text }, { onSuccess: onDone })}
      onLeave={onDone}
    />
  );
}
