import type { MarginNote } from '#shared/contracts/notes.ts';
import { isSettled } from '#shared/notes/note-states.ts';
import { classNames } from '#src/lib/class-names.ts';
import { signature } from '../view/signature.ts';
import { NoteActions } from './note-actions.tsx';

interface NoteLinesProps {
  readonly note: MarginNote;
  readonly isGone: boolean;
}

/** A remark, signed at its end, with what was said to it. All of it is plain text. */
export function NoteLines({ note, isGone }: NoteLinesProps) {
  const settled = isSettled(note.state);
  const about = note.anchor.said;
  return (
    <article
      className={classNames('margin-note', settled && 'is-settled', isGone && 'is-gone')}
      aria-label={`Note ${note.n}, ${note.state}`}
    >
      {!isGone && <span className="note-leader" aria-hidden="true" />}
      <p className="note-remark">
        <b>{note.n}</b> {note.text} <Signed by={note.by} at={note.at} />
      </p>
      {isGone ? (
        <p className="note-gone">What this was about is not in the text any more: “{about}”.</p>
      ) : (
        <p className="sr-only">
          About “{about}”, in {note.section}.
        </p>
      )}
      {note.answers.map(({ id, text, by, at }) => (
        <p key={id} className="note-answer">
          – {text} <Signed by={by} at={at} />
        </p>
      ))}
      {note.settled && (
        <p className="note-answer">
          – <b>{note.state === 'agreed' ? 'Agreed.' : 'Held to:'}</b> {note.settled.reason}{' '}
          <Signed by={note.settled.by} at={note.settled.at} />
        </p>
      )}
      <NoteActions note={note} />
    </article>
  );
}

function Signed({ by, at }: { readonly by: string; readonly at: string }) {
  return <span className="note-signed">{signature(by, at, new Date())}</span>;
}
