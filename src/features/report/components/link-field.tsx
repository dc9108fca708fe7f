import { getMarkRange, type Editor } from '@tiptap/react';
import { useState } from 'react';
import { Field } from '#src/components/field.tsx';
import { say } from '#src/lib/sill-store.ts';
import { linkAddress } from '../editor/link-address.ts';

/** Where the chosen words lead to: one line above the sill; Enter keeps it, Escape leaves it as it was. */
export function LinkField({ editor, onClose }: { readonly editor: Editor; readonly onClose: () => void }) {
  const before = String(editor.getAttributes('link').href ?? '');
  const [typed, setTyped] = useState(before);
  const [fault, setFault] = useState<string>();
  const keep = () => {
    const address = linkAddress(typed, window.location.origin);
    if (!address.ok) {
      setFault(address.sentence);
      return;
    }
    onClose();
    editor.chain().focus().extendMarkRange('link').setLink({ href: address.href }).run();
    say(before === '' ? 'The words are a link now.' : 'The link leads there now.');
  };
  const leave = () => {
    onClose();
    editor.commands.focus();
  };
  return (
    <form
      noValidate
      role="dialog"
      aria-label="Where the link leads"
      className="rises absolute bottom-11 left-10 z-[8] w-[386px] max-w-[calc(100vw-32px)] rounded-sm bg-paper px-4.5 py-3 shadow-card"
      onSubmit={(event) => {
        event.preventDefault();
        keep();
      }}
      onKeyDown={(event) => {
        event.stopPropagation();
        if (event.key !== 'Escape') return;
        event.preventDefault();
        leave();
      }}
      onBlur={({ currentTarget, relatedTarget }) => {
        if (!currentTarget.contains(relatedTarget)) onClose();
      }}
    >
      <Field
        // It opened at one's press: one types on at once.
        ref={(field) => {
          if (field && !field.form?.contains(document.activeElement)) field.focus();
        }}
        label={`“${wordsOf(editor)}” leads to`}
        placeholder="https://… or /team/… or #4"
        spellCheck={false}
        autoComplete="off"
        error={fault}
        value={typed}
        onChange={(event) => {
          setTyped(event.target.value);
          setFault(undefined);
        }}
      />
      <p className="mt-2 text-xs text-ink-3">Enter keeps it, Escape leaves it.</p>
    </form>
  );
}

/** The words that are or become the link, cut where they are many. */
function wordsOf({ state }: Editor): string {
  const { selection, doc, schema } = state;
  const link = schema.marks.link;
  const range = selection.empty && link ? (getMarkRange(selection.$from, link) ?? selection) : selection;
  const words = doc.textBetween(range.from, range.to, ' ');
  return words.length > 40 ? `${words.slice(0, 39)}…` : words;
}
