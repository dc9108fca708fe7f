import type { Editor } from '@tiptap/core';
import { useEffect, useState } from 'react';
import { MAX_QUOTE_LENGTH, type QuestionAbout } from '#shared/contracts/copy-questions.ts';

export type Passage = Extract<QuestionAbout, { kind: 'passage' }>;

/** The passage of the report that is marked now; null when none is. It stays while the focus goes to the foot. */
export function useSelectedPassage(editor: Editor | null): Passage | null {
  const [passage, setPassage] = useState<Passage | null>(null);
  useEffect(() => {
    if (!editor) return undefined;
    const look = () => {
      const next = passageOf(editor);
      if (next !== undefined) setPassage(next);
    };
    document.addEventListener('selectionchange', look);
    return () => document.removeEventListener('selectionchange', look);
  }, [editor]);
  return passage;
}

/** Undefined: the selection is somewhere else, and says nothing about the report. */
function passageOf(editor: Editor): Passage | null | undefined {
  const selection = window.getSelection();
  if (!selection || selection.rangeCount === 0 || editor.isDestroyed) return undefined;
  const range = selection.getRangeAt(0);
  const { view } = editor;
  if (!view.dom.contains(range.commonAncestorContainer)) return undefined;
  const quote = selection.toString().replaceAll(/\s+/g, ' ').trim();
  if (quote === '') return null;
  const from = view.posAtDOM(range.startContainer, range.startOffset);
  const to = view.posAtDOM(range.endContainer, range.endOffset);
  if (from < 0 || to <= from) return null;
  return { kind: 'passage', from, to, quote: shorten(quote) };
}

function shorten(quote: string): string {
  return quote.length <= MAX_QUOTE_LENGTH ? quote : `${quote.slice(0, MAX_QUOTE_LENGTH - 1).trimEnd()}…`;
}
