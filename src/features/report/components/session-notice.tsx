import type { Editor } from '@tiptap/react';
import { Notice } from '#src/components/notice.tsx';
import { Word } from '#src/components/word.tsx';
import { say } from '#src/lib/sill-store.ts';
import type { ReportState } from '../session/report-session.ts';

/** What the writer must know about where the text is; nothing while all is well. */
export function SessionNotice({
  state,
  editor,
}: {
  readonly state: ReportState;
  readonly editor: Editor | null;
}) {
  const copy = () =>
    void navigator.clipboard.writeText(editor?.getText() ?? '').then(
      () => say('The text of this page is copied.'),
      () => say('The text could not be copied; mark it and copy it by hand.'),
    );
  if (state.phase === 'refused') {
    return (
      <Notice title="This page is of another version than the server.">
        It was not connected, so that nothing of the report is lost. Load it again; what you typed here stays
        in this browser. <Word onClick={() => window.location.reload()}>Load again</Word>{' '}
        {editor && <Word onClick={copy}>Copy the text first</Word>}
      </Notice>
    );
  }
  if (state.phase === 'gone') {
    return (
      <Notice title="This report is not open to you any more.">
        Ask the captain of the team whether your role was changed.
      </Notice>
    );
  }
  if (state.readOnly && state.unsynced > 0) {
    return (
      <Notice title="You may read here, and no longer write.">
        What you typed before your role was changed is still in this browser, but was not taken.{' '}
        <Word onClick={copy}>Copy the text</Word>
      </Notice>
    );
  }
  return null;
}
