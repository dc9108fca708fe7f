import { Node as TiptapNode } from '@tiptap/core';
import { InlineFormula } from '#shared/report/schema/inline-formula-node.ts';
import { seenOnce } from './seen-once.ts';

/** A formula inside a sentence; pressed, it shows what was typed until the caret leaves. */
export const InlineFormulaView = TiptapNode.create({
  ...InlineFormula.config,
  name: 'inlineFormula',
  addNodeView() {
    return ({ node, view, getPos }) => {
      const dom = document.createElement('span');
      dom.className = 'inline-formula';
      dom.contentEditable = 'false';
      let latex = String(node.attrs.latex ?? '');
      let isSeen = false;
      const draw = async () => {
        if (!isSeen) return;
        const { drawKatex } = await import('#src/components/draw-katex.ts');
        dom.title = drawKatex(dom, latex || '\\square', { display: false }) ?? '';
      };
      const forget = seenOnce(dom, () => {
        isSeen = true;
        void draw();
      });
      const keep = (typed: string) => {
        const position = getPos();
        if (position === undefined) return;
        view.dispatch(view.state.tr.setNodeAttribute(position, 'latex', typed.slice(0, 2000)));
        void draw();
        view.focus();
      };
      const edit = () => {
        if (!view.editable) return;
        const field = document.createElement('input');
        field.className = 'typed-formula';
        field.setAttribute('aria-label', 'Formula, typed');
        field.spellcheck = false;
        field.value = latex;
        field.size = Math.max(6, latex.length);
        let isDone = false;
        const finish = (typed: string) => {
          if (isDone) return;
          isDone = true;
          keep(typed);
        };
        field.addEventListener('blur', () => finish(field.value));
        field.addEventListener('keydown', (event) => {
          event.stopPropagation();
          if (event.key === 'Enter') finish(field.value);
          if (event.key === 'Escape') finish(latex);
        });
        dom.replaceChildren(field);
        field.focus();
      };
      dom.addEventListener('click', () => {
        if (!dom.querySelector('input')) edit();
      });
      dom.addEventListener('formula:edit', edit);
      return {
        dom,
        update(next) {
          if (next.type !== node.type) return false;
          latex = String(next.attrs.latex ?? '');
          if (!dom.querySelector('input')) void draw();
          return true;
        },
        ignoreMutation: () => true,
        stopEvent: (event) => event.target instanceof HTMLInputElement,
        destroy: forget,
      };
    };
  },
});
