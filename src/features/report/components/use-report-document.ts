import type { Editor } from '@tiptap/react';
import { useEffect, useState } from 'react';
import type { ReportDocument } from '#shared/report/schema/report-node.ts';

const SETTLED_AFTER_MS = 300;

/** The document as JSON, a moment after the last change: for numbers and levels, which need not follow each key. */
export function useReportDocument(editor: Editor): ReportDocument {
  const [document, setDocument] = useState(() => editor.getJSON() as ReportDocument);
  useEffect(() => {
    let timer: ReturnType<typeof setTimeout> | undefined;
    const later = () => {
      clearTimeout(timer);
      timer = setTimeout(() => setDocument(editor.getJSON() as ReportDocument), SETTLED_AFTER_MS);
    };
    editor.on('update', later);
    later();
    return () => {
      clearTimeout(timer);
      editor.off('update', later);
    };
  }, [editor]);
  return document;
}
