import { useId, useState } from 'react';
import { Button } from '#src/components/button.tsx';
import { Dialog } from '#src/components/dialog.tsx';
import { TextArea } from '#src/components/text-area.tsx';
import type { GroupLines, TrialLine } from '../view/series-view.ts';

interface ExcludeDialogProps {
  readonly line: TrialLine;
  readonly group: GroupLines;
  /** A value in SI as the drawn reading is shown: "46.1 cm". */
  readonly show: (value: number) => string;
  readonly onClose: () => void;
  readonly onExclude: (reason: string) => void;
}

/** Asks for the reason, and says in numbers what leaving the trial out does. */
export function ExcludeDialog({ line, group, show, onClose, onExclude }: ExcludeDialogProps) {
  const form = useId();
  const [reason, setReason] = useState('');
  const [asked, setAsked] = useState(false);
  const isEmpty = reason.trim() === '';
  return (
    <Dialog
      open
      onClose={onClose}
      title={`Leave ${line.name} out?`}
      sentence={consequence(line, group, show)}
      actions={
        <>
          <Button kind="plain" onClick={onClose}>
            Keep it
          </Button>
          <Button kind="risk" type="submit" form={form}>
            Exclude {line.name}
          </Button>
        </>
      }
    >
      <form
        id={form}
        onSubmit={(event) => {
          event.preventDefault();
          setAsked(true);
          if (!isEmpty) onExclude(reason.trim());
        }}
      >
        <TextArea
          label="Why it is left out"
          hint="An opponent will read this sentence. Say what went wrong, not that the value is off."
          error={asked && isEmpty ? 'Say why it is left out.' : undefined}
          maxLength={400}
          rows={2}
          value={reason}
          onChange={(event) => setReason(event.target.value)}
        />
      </form>
    </Dialog>
  );
}

function consequence(line: TrialLine, group: GroupLines, show: (value: number) => string): string {
  const kept = group.lines.filter(({ trial, value }) => !trial.excluded && value !== null);
  const others = kept.filter(({ trial }) => trial.id !== line.trial.id);
  if (line.value === null) return 'It stays in view, hollow, and counts for nothing.';
  if (others.length === 0) return 'It is the only trial at this setting; without it there is no mean here.';
  const mean = (lines: readonly TrialLine[]) =>
    lines.reduce((sum, { value }) => sum + (value ?? 0), 0) / lines.length;
  return `It reads ${show(line.value)}. The mean here goes from ${show(mean(kept))} of ${kept.length} to ${show(mean(others))} of ${others.length}. The trial stays in view, hollow, with your reason.`;
}
