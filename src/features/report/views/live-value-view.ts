import { Node as TiptapNode } from '@tiptap/core';
import type { Node as ProseMirrorNode } from '@tiptap/pm/model';
import { NodeSelection } from '@tiptap/pm/state';
import { splitSymbol } from '#shared/formatting/symbol.ts';
import { showValue, type Shown } from '#shared/report/live-value.ts';
import { LiveValue, type LiveValueAttributes } from '#shared/report/schema/live-value-node.ts';
import { LINE_VISITED } from '../editor/visited-lines.ts';
import type { ReadingMarks } from '../editor/reading-marks.ts';
import { MovedMark } from './moved-mark.ts';
import { liveValueClass } from '#src/components/live-value-text.tsx';
import type { FindingsStore } from '#src/lib/findings/findings-store.ts';

export interface OpenValue {
  readonly attrs: LiveValueAttributes;
  readonly element: HTMLElement;
  /** By a key, so that the focus goes into the card. */
  readonly byKey: boolean;
}

interface LiveValueOptions {
  readonly store: FindingsStore | null;
  readonly marks: ReadingMarks | null;
  readonly onOpen: (value: OpenValue) => void;
}

/** A tied number: plain elements on a subscription of its own, so that typing stays fast however many there are. */
export const LiveValueView = TiptapNode.create<LiveValueOptions>({
  ...LiveValue.config,
  name: 'liveValue',
  addOptions: () => ({ store: null, marks: null, onOpen: () => undefined }),
  addKeyboardShortcuts() {
    return {
      Enter: ({ editor }) => {
        const { selection } = editor.state;
        if (!(selection instanceof NodeSelection) || selection.node.type !== this.type) return false;
        const element = editor.view.nodeDOM(selection.from);
        if (!(element instanceof HTMLElement)) return false;
        this.options.onOpen({ attrs: selection.node.attrs as LiveValueAttributes, element, byKey: true });
        return true;
      },
    };
  },
  addNodeView() {
    const { store, marks, onOpen } = this.options;
    return ({ node }) => {
      const dom = document.createElement('span');
      dom.contentEditable = 'false';
      dom.tabIndex = 0;
      dom.setAttribute('role', 'button');
      dom.setAttribute('aria-haspopup', 'dialog');
      let attrs = attributesOf(node);
      let stop: (() => void) | undefined;
      const mark = new MovedMark(dom, marks);
      const draw = () => {
        const text = drawValue(dom, attrs, store);
        mark.show(JSON.stringify([attrs.ref, attrs.form, attrs.unit]), text);
      };
      const bind = () => {
        stop?.();
        stop = store?.subscribeTo(attrs.ref, draw);
        draw();
      };
      const open = (byKey: boolean) => {
        mark.visit();
        onOpen({ attrs, element: dom, byKey });
      };
      dom.addEventListener(LINE_VISITED, () => mark.visit());
      dom.addEventListener('click', () => open(false));
      dom.addEventListener('keydown', (event) => {
        if (event.key !== 'Enter' && event.key !== ' ') return;
        event.preventDefault();
        event.stopPropagation();
        open(true);
      });
      bind();
      return {
        dom,
        update(next) {
          if (next.type !== node.type) return false;
          attrs = attributesOf(next);
          bind();
          return true;
        },
        ignoreMutation: () => true,
        stopEvent: (event) => event.type === 'keydown' && event.target === dom,
        destroy: () => {
          stop?.();
          mark.forget();
        },
      };
    };
  },
});

const attributesOf = (node: ProseMirrorNode) => node.attrs as LiveValueAttributes;

function drawValue(dom: HTMLElement, attrs: LiveValueAttributes, store: FindingsStore | null): string | null {
  const snapshot = store?.get();
  if (!snapshot) return null;
  const shown = showValue(attrs.ref, attrs.form, attrs.unit, snapshot.evidence, snapshot.findings);
  const isGone = shown.state === 'fault';
  dom.className = liveValueClass(shown.hue, isGone ? 'gone' : 'fresh', false);
  dom.setAttribute('aria-label', isGone ? `${shown.spoken}. ${shown.fault?.sentence ?? ''}` : shown.spoken);
  dom.dataset.shown = shown.text;
  dom.replaceChildren(...piecesOf(shown, isGone ? attrs.shown : null));
  return isGone ? null : shown.text;
}

function piecesOf(shown: Shown, lastShown: string | null): (Node | string)[] {
  if (lastShown) return [lastShown];
  const parts = shown.symbol === null ? null : splitSymbol(shown.symbol);
  if (!parts) return [shown.text];
  const symbol = document.createElement('span');
  symbol.className = 'sym';
  symbol.append(parts.letter);
  if (parts.sub) {
    const sub = document.createElement('sub');
    sub.textContent = parts.sub;
    symbol.append(sub);
  }
  return [symbol, `\u00a0=\u00a0${shown.value}`];
}
