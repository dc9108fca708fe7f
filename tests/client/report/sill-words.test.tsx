/** The words at the foot of the report, and the list that opens where a symbol and ± are written. */
import { act, cleanup, screen, within } from '@testing-library/react';
import { Editor } from '@tiptap/core';
import { createRef } from 'react';
import { afterEach, beforeAll, beforeEach, describe, expect, test } from 'vitest';
import { reportExtensions } from '#shared/report/schema/report-extensions.ts';
import { PutInWords } from '#src/features/report/components/put-in-words.tsx';
import { TieList } from '#src/features/report/components/tie-list.tsx';
import type { FindingsStore } from '#src/lib/findings/findings-store.ts';
import { spoutEvidence } from '../support/leaning-spout.ts';
import { evaluated, renderInProblem } from '../support/render-in-problem.tsx';

const EMPTY = {
  type: 'doc',
  content: ['Phenomenon', 'Model', 'Experiment', 'Comparison', 'Conclusion'].map((name) => ({
    type: `section${name}`,
    content: [{ type: 'paragraph' }],
  })),
};

let store: FindingsStore;
let editor: Editor;

beforeAll(async () => {
  store = await evaluated(spoutEvidence());
  // jsdom lays nothing out.
  const nowhere = () =>
    ({ top: 0, bottom: 0, left: 0, right: 0, width: 0, height: 0, x: 0, y: 0 }) as DOMRect;
  Object.assign(Range.prototype, { getClientRects: () => [nowhere()], getBoundingClientRect: nowhere });
  Object.assign(document, { elementFromPoint: () => null });
});
beforeEach(() => {
  editor = new Editor({
    element: document.body.appendChild(document.createElement('div')),
    extensions: reportExtensions(),
    content: EMPTY,
  });
  editor.commands.setTextSelection(2);
});
afterEach(() => {
  cleanup();
  editor.destroy();
  document.body.replaceChildren();
});

const type = (text: string) => act(() => editor.commands.insertContent(text));
const firstSection = () => editor.state.doc.child(0);

describe('the words of the sill', () => {
  test('are walked with the arrows, round the end', async () => {
    const { user } = renderInProblem(<PutInWords editor={editor} />, store);
    const bar = within(screen.getByRole('toolbar', { name: 'Put in' }));
    bar.getByRole('button', { name: 'Value' }).focus();

    await user.keyboard('{ArrowRight}');
    expect(document.activeElement).toBe(bar.getByRole('button', { name: 'Formula' }));
    await user.keyboard('{ArrowLeft}{ArrowLeft}');
    expect(document.activeElement).toBe(bar.getByRole('button', { name: 'Line' }));
  });

  test('a value: is found by typing and put in at the caret by Enter', async () => {
    const { user } = renderInProblem(<PutInWords editor={editor} />, store);
    await user.click(screen.getByRole('button', { name: 'Value' }));
    await user.type(screen.getByRole('combobox', { name: 'Value, which?' }), 'spout above the tray');

    const [option] = screen.getAllByRole('option');
    expect(option?.textContent).toContain('12.00\u00a0±\u00a00.10\u00a0cm');
    expect(option?.getAttribute('aria-selected')).toBe('true');
    await user.keyboard('{Enter}');

    expect(firstSection().firstChild?.firstChild?.attrs.ref).toEqual({ kind: 'quantity', quantity: 'q-y' });
    expect(screen.queryByRole('listbox')).toBeNull();
  });

  test('a link: nothing chosen, it says to choose words; words chosen, it asks where and keeps it', async () => {
    const { user } = renderInProblem(<PutInWords editor={editor} />, store);
    type('sand');
    const ask = async () => {
      await user.click(screen.getByRole('button', { name: 'Line' }));
      await user.type(screen.getByRole('combobox', { name: 'Line, which?' }), 'link{Enter}');
    };
    await ask();
    expect(screen.queryByRole('dialog')).toBeNull();

    act(() => editor.commands.setTextSelection({ from: 2, to: 6 }));
    await ask();
    const dialog = within(screen.getByRole('dialog', { name: 'Where the link leads' }));
    await user.type(dialog.getByLabelText('“sand” leads to'), 'javascript:x{Enter}');
    expect(dialog.getByRole('alert').textContent).toContain('A link leads to the web');
    await user.clear(dialog.getByLabelText('“sand” leads to'));
    await user.type(dialog.getByLabelText('“sand” leads to'), 'skerry.example{Enter}');

    expect(editor.getAttributes('link').href).toBe('https://skerry.example');
    expect(screen.queryByRole('dialog')).toBeNull();
  });

  test('a table: its rows and columns are offered only with the caret in one', async () => {
    const { user } = renderInProblem(<PutInWords editor={editor} />, store);
    await user.click(screen.getByRole('button', { name: 'Table' }));
    expect(screen.queryByRole('option', { name: 'one more row below' })).toBeNull();
    await user.click(screen.getByRole('option', { name: 'a table that is typed' }));
    const rows = () => editor.view.dom.querySelectorAll('tr').length;
    expect(rows()).toBe(3);

    await user.click(screen.getByRole('button', { name: 'Table' }));
    await user.click(screen.getByRole('option', { name: 'one more row below' }));
    expect(rows()).toBe(4);
  });

  test('a plate: is asked for as a picture', () => {
    renderInProblem(<PutInWords editor={editor} />, store);

    expect(screen.getByLabelText('Picture of the plate').getAttribute('accept')).toBe('image/*');
  });
});

describe('the list at the line', () => {
  const open = () => {
    const page = createRef<HTMLElement>();
    return renderInProblem(
      <section ref={page}>
        <TieList editor={editor} page={page} />
      </section>,
      store,
    );
  };

  test('when a symbol and ± are written: opens, tied to the caret, arrows move and Enter ties', async () => {
    const { user } = open();
    type('At 45° we find R +-');
    const list = screen.getByRole('listbox', { name: 'Values of range on the tray' });
    const selected = () => within(list).getByRole('option', { selected: true });
    const first = selected().textContent;
    expect(editor.view.dom.getAttribute('aria-activedescendant')).toBe(selected().id);

    act(() => editor.view.focus());
    await user.keyboard('{ArrowDown}');
    expect(selected().textContent).not.toBe(first);
    expect(editor.view.dom.getAttribute('aria-activedescendant')).toBe(selected().id);
    await user.keyboard('{ArrowUp}{Enter}');

    expect(firstSection().firstChild?.lastChild?.type.name).toBe('liveValue');
    expect(firstSection().textContent).not.toContain('+-');
    expect(screen.queryByRole('listbox')).toBeNull();
  });

  test('when Escape is pressed: the ± stays as text and the list does not come back for it', async () => {
    const { user } = open();
    type('R ±');
    act(() => editor.view.focus());
    await user.keyboard('{Escape}');

    expect(screen.queryByRole('listbox')).toBeNull();
    type(' ');
    expect(screen.queryByRole('listbox')).toBeNull();
    expect(firstSection().textContent).toContain('R ±');
  });

  test('after a plain number: ± is only ±', () => {
    open();
    type('about 12 +-');

    expect(screen.queryByRole('listbox')).toBeNull();
  });
});
