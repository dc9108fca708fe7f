import { useId, useState } from 'react';
import { Button } from '#src/components/button.tsx';
import { Dialog } from '#src/components/dialog.tsx';
import { Notice } from '#src/components/notice.tsx';
import { TextArea } from '#src/components/text-area.tsx';
import { sentenceOf } from '#src/lib/api/api-error.ts';

interface FreezeDialogProps {
  readonly n: number;
  /** "31 trials, 18 tied numbers"; null while the draft is on its way. */
  readonly figures: string | null;
  readonly isFreezing: boolean;
  readonly error: unknown;
  readonly onClose: () => void;
  readonly onFreeze: (note: string) => void;
}

/** Asks once, says in numbers what is kept, and takes the note that stands beside the edition. */
export function FreezeDialog({ n, figures, isFreezing, error, onClose, onFreeze }: FreezeDialogProps) {
  const form = useId();
  const [note, setNote] = useState('');
  return (
    <Dialog
      open
      onClose={onClose}
      title={`Freeze edition ${n}?`}
      sentence={`${figures === null ? 'Text, trials' : capital(figures)} and all verdicts are kept as they stand now, under a seal. Nobody can change or remove an edition; the draft stays open.`}
      actions={
        <>
          <Button kind="plain" onClick={onClose}>
            Keep writing
          </Button>
          <Button type="submit" form={form} busy={isFreezing}>
            {isFreezing ? `Freezing edition ${n}` : `Freeze edition ${n}`}
          </Button>
        </>
      }
    >
      <form
        id={form}
        onSubmit={(event) => {
          event.preventDefault();
          onFreeze(note.trim());
        }}
      >
        <TextArea
          label="Note"
          hint="What it is for, or what is new in it. The team reads it; it is not printed."
          maxLength={400}
          rows={2}
          value={note}
          onChange={(event) => setNote(event.target.value)}
        />
      </form>
      {error !== null && (
        <Notice title="It is not frozen." className="mt-3.5">
          {sentenceOf(error)}
        </Notice>
      )}
    </Dialog>
  );
}

function capital(words: string): string {
  return words.charAt(0).toUpperCase() + words.slice(1);
}
