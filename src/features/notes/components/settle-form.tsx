import { useState } from 'react';
import type { MarginNote } from '#shared/contracts/notes.ts';
import { Choice, ChoiceGroup } from '#src/components/choice-group.tsx';
import { useProblem } from '#src/lib/problem/problem-context.ts';
import { useChangeNote } from '../api/change-notes.ts';
import { NoteForm } from './note-form.tsx';

/** Agreed; or the text is held to, which needs its reason. */
export function SettleForm({ note, onDone }: { readonly note: MarginNote; readonly onDone: () => void }) {
  const { address } = useProblem();
  const [isHeld, setHeld] = useState(false);
  const settle = useChangeNote(address);
  return (
    <NoteForm
      label="The reason"
      action="Settle note"
      failed="The note was not settled."
      error={settle.error}
      isPending={settle.isPending}
      hasText={isHeld}
      onSend={(reason) =>
        settle.mutate(
          { note: note.id, change: isHeld ? { kind: 'hold to', reason } : { kind: 'agree' } },
          { onSuccess: onDone },
        )
      }
      onLeave={onDone}
    >
      <ChoiceGroup legend={`How is note ${note.n} settled?`}>
        <Choice
          kind="radio"
          name={`settle-${note.id}`}
          words="Agreed"
          checked={!isHeld}
          onChange={() => setHeld(false)}
        />
        <Choice
          kind="radio"
          name={`settle-${note.id}`}
          words="Held to"
          checked={isHeld}
          onChange={() => setHeld(true)}
        />
      </ChoiceGroup>
    </NoteForm>
  );
}
