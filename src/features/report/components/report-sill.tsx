import type { Editor } from '@tiptap/react';
import { SillBar, SillSentence } from '#src/components/sill.tsx';
import { timeOfDay } from '#src/lib/dates/say-date.ts';
import { countOf } from '#src/lib/say/count-of.ts';
import { looseNumbersOf } from '../editor/loose-numbers.ts';
import type { ReportState } from '../session/report-session.ts';
import { PutInWords } from './put-in-words.tsx';

/** What can be put in, what has happened, what is not tied, and whether it is kept. */
export function ReportSill({
  editor,
  state,
  notTied,
}: {
  readonly editor: Editor;
  readonly state: ReportState;
  readonly notTied: number;
}) {
  const next = () => {
    const loose = looseNumbersOf(editor.state);
    const after = loose.find(({ from }) => from > editor.state.selection.to) ?? loose[0];
    if (after) editor.chain().focus().setTextSelection(after).scrollIntoView().run();
  };
  return (
    <SillBar label="Sill">
      {!state.readOnly && (
        <div className="max-sm:hidden">
          <PutInWords editor={editor} />
        </div>
      )}
      <span className="mx-auto min-w-0">
        <SillSentence />
      </span>
      {notTied > 0 && (
        <button type="button" className="px-2 text-xs font-semibold text-leak" onClick={next}>
          {countOf(notTied, 'number')} not tied
        </button>
      )}
      <span className="ml-4 text-xs whitespace-nowrap text-ink-2">{keptWords(state)}</span>
    </SillBar>
  );
}

/** "Kept" is said only when the server has said that it is on disk. */
function keptWords({ readOnly, isConnected, unsynced, keptAt }: ReportState): string {
  if (readOnly) return 'You read here';
  if (!isConnected) return unsynced > 0 ? 'Not kept yet; the server is away' : 'The server is away';
  if (unsynced > 0) return 'Not kept yet';
  return keptAt ? `Kept ${timeOfDay(keptAt)}` : '';
}
