import type { Editor } from '@tiptap/react';
import type { Evidence } from '#shared/evidence/evidence.ts';
import type { Findings } from '#shared/evidence/findings.ts';
import { optionsForSymbol } from '#shared/report/value-options.ts';
import { say } from '#src/lib/sill-store.ts';
import { putIn } from '../editor/put-in.ts';
import type { ListedOption } from './list-at-place.tsx';

/** What can be put in, in the order of the sill. */
export const KINDS = ['Value', 'Formula', 'Chart', 'Table', 'Claim', 'Plate', 'Line'] as const;
export type Kind = (typeof KINDS)[number];

export interface PutInOption extends ListedOption {
  readonly run: () => void;
}

/** Everything of one kind that could be put in at the caret. */
export function putInOptions(
  kind: Exclude<Kind, 'Plate'>,
  editor: Editor,
  askLink: () => void,
  evidence: Evidence,
  findings: Findings,
): readonly PutInOption[] {
  switch (kind) {
    case 'Value':
      return evidence.quantities.flatMap(({ symbol, name }) =>
        optionsForSymbol(symbol, evidence, findings, '').map(({ key, ref, words, text, hue }) => ({
          key: `${symbol} ${key}`,
          words: `${symbol}, ${name}: ${words}`,
          text,
          hue,
          run: () => putIn.value(editor, ref, text),
        })),
      );
    case 'Formula':
      return formulaOptions(editor, evidence);
    case 'Chart':
      return evidence.charts.map(({ id, n, comparison }) => ({
        key: id,
        words: evidence.comparisons.find((row) => row.id === comparison)?.name ?? `chart ${n}`,
        run: () => putIn.chart(editor, id),
      }));
    case 'Table':
      return [
        ...typedTableOptions(editor),
        ...evidence.series.map(({ id, letter, name }) => ({
          key: id,
          words: `trials of series ${letter}, ${name}`,
          run: () => putIn.trialsTable(editor, id),
        })),
        { key: 'typed', words: 'a table that is typed', run: () => putIn.typedTable(editor) },
      ];
    case 'Claim':
      return evidence.claims.map(({ id, n, text }) => ({
        key: id,
        words: `${n}  ${text}`,
        run: () => putIn.claim(editor, id),
      }));
    case 'Line':
      return lineOptions(editor, askLink);
  }
}

function formulaOptions(editor: Editor, evidence: Evidence): readonly PutInOption[] {
  const symbolOf = (id: string) => evidence.quantities.find((row) => row.id === id)?.symbol ?? '?';
  const last = evidence.series.at(-1);
  const setting = evidence.trials.findLast((trial) => trial.series === last?.id && !trial.withdrawn);
  const at = Object.fromEntries(
    (last?.settings ?? []).flatMap((id) => (setting?.values[id] ? [[id, setting.values[id]]] : [])),
  );
  const equations = [...evidence.models]
    .sort((a, b) => b.n - a.n)
    .flatMap(({ id: model, n, equations: rows }) =>
      rows.flatMap(({ defines }) =>
        (['symbols', 'numbers and result'] as const).map((steps) => ({
          key: `${model} ${defines} ${steps}`,
          words: `${symbolOf(defines)} of model ${n}${steps === 'symbols' ? '' : ', with numbers put in'}`,
          run: () => putIn.equation(editor, { model, defines, series: last?.id ?? null, at, steps }),
        })),
      ),
    );
  return [
    { key: 'inline', words: 'typed, inside the sentence', run: () => putIn.inlineFormula(editor) },
    { key: 'typed', words: 'typed, on a line of its own', run: () => putIn.typedFormula(editor) },
    ...equations,
  ];
}

/** What the line at the caret is: the keys for bold and italic work besides. */
function lineOptions(editor: Editor, askLink: () => void): readonly PutInOption[] {
  const chain = () => editor.chain().focus();
  return [
    { key: 'paragraph', words: 'plain line', run: () => void chain().setParagraph().run() },
    { key: 'heading', words: 'heading', run: () => void chain().setHeading({ level: 2 }).run() },
    { key: 'smaller', words: 'smaller heading', run: () => void chain().setHeading({ level: 3 }).run() },
    { key: 'bullets', words: 'list with dots', run: () => void chain().toggleBulletList().run() },
    { key: 'numbers', words: 'list with numbers', run: () => void chain().toggleOrderedList().run() },
    { key: 'bold', words: 'bold', text: 'Ctrl B', run: () => void chain().toggleBold().run() },
    { key: 'italic', words: 'italic', text: 'Ctrl I', run: () => void chain().toggleItalic().run() },
    ...linkOptions(editor, askLink),
    { key: 'undo', words: 'undo my last change', text: 'Ctrl Z', run: () => void chain().undo().run() },
  ];
}

function linkOptions(editor: Editor, askLink: () => void): readonly PutInOption[] {
  if (editor.isActive('link')) {
    const remove = () => void editor.chain().focus().extendMarkRange('link').unsetLink().run();
    return [
      { key: 'link', words: 'change where the link leads', run: askLink },
      { key: 'follow', words: 'follow the link', run: () => follow(editor) },
      { key: 'unlink', words: 'no link any more', run: remove },
    ];
  }
  const ask = () => {
    if (!editor.state.selection.empty) return askLink();
    editor.commands.focus();
    say('Choose the words that shall lead somewhere, then take link.');
  };
  return [{ key: 'link', words: 'link, on the chosen words', run: ask }];
}

function follow(editor: Editor): void {
  window.open(String(editor.getAttributes('link').href), '_blank', 'noopener');
}

/** Rows and columns of the typed table that the caret is in. */
function typedTableOptions(editor: Editor): readonly PutInOption[] {
  if (!editor.isActive('table')) return [];
  const chain = () => editor.chain().focus();
  return [
    { key: 'row below', words: 'one more row below', run: () => void chain().addRowAfter().run() },
    { key: 'row above', words: 'one more row above', run: () => void chain().addRowBefore().run() },
    { key: 'column after', words: 'one more column after', run: () => void chain().addColumnAfter().run() },
    {
      key: 'column before',
      words: 'one more column before',
      run: () => void chain().addColumnBefore().run(),
    },
    { key: 'no row', words: 'take this row out', run: () => void chain().deleteRow().run() },
    { key: 'no column', words: 'take this column out', run: () => void chain().deleteColumn().run() },
    { key: 'no table', words: 'take the whole table out', run: () => void chain().deleteTable().run() },
  ];
}
