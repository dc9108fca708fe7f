import { useEffect, useRef, useState, type ReactNode } from 'react';
import { MAX_NOTE } from '#shared/contracts/notes.ts';
import { Button } from '#src/components/button.tsx';
import { Notice } from '#src/components/notice.tsx';
import { TextArea } from '#src/components/text-area.tsx';
import { Word } from '#src/components/word.tsx';
import { sentenceOf } from '#src/lib/api/api-error.ts';

interface NoteFormProps {
  readonly label: string;
  /** What the main button does: "Write note". */
  readonly action: string;
  readonly failed: string;
  readonly error: Error | null;
  readonly isPending: boolean;
  /** Above the text. */
  readonly children?: ReactNode;
  readonly hasText?: boolean;
  readonly onSend: (text: string) => void;
  readonly onLeave: () => void;
}

/** A few lines of plain text in the margin. */
export function NoteForm(props: NoteFormProps) {
  const { label, action, failed, error, isPending, children, hasText = true, onSend, onLeave } = props;
  const [text, setText] = useState('');
  const form = useRef<HTMLFormElement>(null);
  useEffect(() => form.current?.querySelector<HTMLElement>('textarea, input, select')?.focus(), []);
  return (
    <form
      ref={form}
      className="note-form"
      onSubmit={(event) => {
        event.preventDefault();
        onSend(text.trim());
      }}
      onKeyDown={(event) => {
        if (event.key !== 'Escape') return;
        event.preventDefault();
        event.stopPropagation();
        onLeave();
      }}
    >
      {children}
      {hasText && (
        <TextArea
          label={label}
          rows={4}
          maxLength={MAX_NOTE}
          value={text}
          onChange={(event) => setText(event.target.value)}
        />
      )}
      {error && <Notice title={failed}>{sentenceOf(error)}</Notice>}
      <div className="flex flex-wrap items-center gap-x-4 gap-y-2">
        <Button
          type="submit"
          kind="main"
          size="tiny"
          busy={isPending}
          disabled={hasText && text.trim() === ''}
        >
          {action}
        </Button>
        <Word className="text-sm" onClick={onLeave}>
          Leave it
        </Word>
      </div>
    </form>
  );
}
