import type { Extensions } from '@tiptap/core';
import type { Editor } from '@tiptap/react';
import type { ComponentType, RefObject } from 'react';

/** The open page as what stands in its margin needs it. */
export interface OpenPage {
  readonly editor: Editor;
  readonly page: RefObject<HTMLElement | null>;
}

/** What a screen brings to the report from elsewhere. */
export interface ReportSlots {
  /** Beyond the report's own; made once, and they never change the document's form. */
  readonly extensions?: Extensions;
  readonly Margin?: ComponentType<OpenPage>;
}
