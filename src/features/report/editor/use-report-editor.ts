import { Collaboration } from '@tiptap/extension-collaboration';
import { CollaborationCaret } from '@tiptap/extension-collaboration-caret';
import type { Extensions } from '@tiptap/core';
import { useEditor, type Editor } from '@tiptap/react';
import { useEffect, useState } from 'react';
import { reportExtensions } from '#shared/report/schema/report-extensions.ts';
import { settingNames } from '#shared/report/untied-numbers.ts';
import { useEvidence } from '#src/lib/evidence/use-evidence.ts';
import { useProblem } from '#src/lib/problem/problem-context.ts';
import { createStore } from '#src/lib/store/create-store.ts';
import type { ReportSession } from '../session/report-session.ts';
import type { OpenValue } from '../views/live-value-view.ts';
import { reportNodeViews } from '../views/report-node-views.ts';
import { FillSections } from './fill-sections.ts';
import { foldedSections } from './folded-sections.ts';
import { lookAgain, LooseNumbers } from './loose-numbers.ts';
import { readingMarks } from './reading-marks.ts';
import { UnfoldAtCaret } from './unfold-at-caret.ts';
import { VisitedLines } from './visited-lines.ts';

/** A colleague's caret is ink; which colleague is said beside the section, in words. */
const CARET_COLOUR = '#3c525a';

/** The editor of an open report; made once for a session. */
export function useReportEditor(
  session: ReportSession,
  readOnly: boolean,
  onOpen: (value: OpenValue) => void,
  more: Extensions = [],
): Editor {
  const { store, me, role, address } = useProblem();
  const evidence = useEvidence();
  // The extensions are made once; what they call and read changes under them.
  const [open] = useState(() => createStore(onOpen));
  const [settings] = useState(() => createStore(settingNames(evidence)));
  useEffect(() => open.set(onOpen), [open, onOpen]);
  const report = `${address.team}/${address.number}`;
  const [marks] = useState(() => readingMarks(`${report} ${me}`));
  const [folded] = useState(() => foldedSections(report));
  const editor = useEditor(
    {
      editable: !readOnly,
      injectCSS: false,
      shouldRerenderOnTransaction: false,
      extensions: [
        ...reportExtensions(reportNodeViews({ store, marks, folded, onOpen: (value) => open.get()(value) })),
        Collaboration.configure({ fragment: session.fragment }),
        CollaborationCaret.configure({
          provider: session.provider,
          user: { name: me, color: CARET_COLOUR, shape: role === 'advisor' ? 'square' : 'round' },
          render: drawCaret,
        }),
        FillSections,
        VisitedLines,
        UnfoldAtCaret.configure({ folded }),
        LooseNumbers.configure({ getSettings: settings.get }),
        ...more,
      ],
      editorProps: {
        attributes: {
          role: 'textbox',
          'aria-multiline': 'true',
          'aria-label': 'Report',
          class: 'report-text',
          lang: 'en',
        },
      },
    },
    [session],
  );
  useEffect(() => {
    if (editor.isEditable === readOnly) editor.setEditable(!readOnly);
  }, [editor, readOnly]);
  useEffect(() => {
    settings.set(settingNames(evidence));
    editor.view.dispatch(lookAgain(editor.state));
  }, [editor, evidence, settings]);
  return editor;
}

function drawCaret(user: Record<string, unknown>): HTMLElement {
  const caret = document.createElement('span');
  caret.className = user.shape === 'square' ? 'peer-caret peer-caret-square' : 'peer-caret';
  caret.setAttribute('aria-hidden', 'true');
  return caret;
}
