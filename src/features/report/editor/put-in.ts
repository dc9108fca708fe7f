import type { Editor } from '@tiptap/react';
import type { ValueReference } from '#shared/evidence/evidence.ts';
import { anchorFromBytes } from '#shared/report/schema/anchor.ts';
import type { FormulaAttributes } from '#shared/report/schema/formula-node.ts';
import type { PlateAttributes } from '#shared/report/schema/plate-node.ts';

const anchor = () => anchorFromBytes(crypto.getRandomValues(new Uint8Array(6)));

/** What the sill puts in at the caret; each gives the focus back to the text. */
export const putIn = {
  value(editor: Editor, ref: ValueReference, shown: string, range?: { from: number; to: number }) {
    const chain = editor.chain().focus();
    if (range) chain.deleteRange(range);
    chain.insertContent([{ type: 'liveValue', attrs: { ref, form: 'value', unit: null, shown } }]).run();
  },
  inlineFormula(editor: Editor) {
    const at = editor.state.selection.from;
    editor
      .chain()
      .focus()
      .insertContent({ type: 'inlineFormula', attrs: { latex: '' } })
      .run();
    editor.view.nodeDOM(at)?.dispatchEvent(new CustomEvent('formula:edit'));
  },
  typedFormula(editor: Editor) {
    block(editor, 'formula', { ...EQUATION, kind: 'typed', label: anchor() });
  },
  equation(
    editor: Editor,
    equation: Pick<FormulaAttributes, 'model' | 'defines' | 'series' | 'at' | 'steps'>,
  ) {
    block(editor, 'formula', { ...EQUATION, ...equation, kind: 'equation', label: anchor() });
  },
  chart: (editor: Editor, chart: string) => block(editor, 'chart', { chart, caption: '' }),
  trialsTable: (editor: Editor, series: string) => block(editor, 'trialsTable', { series, caption: '' }),
  typedTable(editor: Editor) {
    editor.chain().focus().insertTable({ rows: 3, cols: 3, withHeaderRow: true }).run();
  },
  claim: (editor: Editor, claim: string) => block(editor, 'claim', { claim }),
  plate: (editor: Editor, plate: Pick<PlateAttributes, 'sha' | 'width' | 'height'>) =>
    block(editor, 'plate', { ...plate, caption: '', alt: '' }),
};

const EQUATION = { latex: '', model: null, defines: null, series: null, at: {}, steps: 'symbols' } as const;

function block(editor: Editor, type: string, attrs: Record<string, unknown>): void {
  editor
    .chain()
    .focus()
    .insertContent({ type, attrs: { anchor: anchor(), ...attrs } })
    .run();
}
