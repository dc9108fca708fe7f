import type { Editor } from '@tiptap/react';
import { useState } from 'react';
import { Field } from '#src/components/field.tsx';
import { Select } from '#src/components/select.tsx';
import { useProblem } from '#src/lib/problem/problem-context.ts';
import { useWriteNote } from '../api/change-notes.ts';
import type { BlockChoice } from '../view/block-choices.ts';
import { blockSubject, typedSubject, type NoteSubject } from '../view/note-subject.ts';
import { NoteForm } from './note-form.tsx';

const SELECTED = 'selected';
const TYPED = 'typed';
const SHORT = 32;

interface NewNoteFormProps {
  readonly editor: Editor;
  readonly selected: NoteSubject | null;
  readonly blocks: readonly BlockChoice[];
  readonly onDone: () => void;
}

/** What the note is about and what it says; what was not selected with a pointer can be named instead. */
export function NewNoteForm({ editor, selected, blocks, onDone }: NewNoteFormProps) {
  const { address } = useProblem();
  const [id] = useState(() => crypto.randomUUID());
  const [about, setAbout] = useState(selected && 'anchor' in selected ? SELECTED : TYPED);
  const [words, setWords] = useState('');
  const [problem, setProblem] = useState(selected && 'problem' in selected ? selected.problem : undefined);
  const write = useWriteNote(address);
  const subject = (): NoteSubject => {
    if (about === SELECTED && selected) return selected;
    const block = blocks.find(({ anchor }) => anchor === about);
    return block ? blockSubject(block) : typedSubject(editor.view, words.trim());
  };
  const send = (text: string) => {
    const found = subject();
    if ('problem' in found) setProblem(found.problem);
    else write.mutate({ id, ...found, text }, { onSuccess: onDone });
  };
  const said = selected && 'anchor' in selected ? selected.anchor.said : null;
  return (
    <NoteForm
      label="Your note"
      action="Write note"
      failed="The note was not kept."
      error={write.error}
      isPending={write.isPending}
      onSend={send}
      onLeave={onDone}
    >
      <Select
        label="About"
        value={about}
        error={about === TYPED ? undefined : problem}
        options={[
          ...(said === null ? [] : [{ value: SELECTED, words: `“${shorten(said)}”` }]),
          { value: TYPED, words: 'Words of the report' },
          ...blocks.map(({ anchor, words: name, section }) => ({
            value: anchor,
            words: `${name}, in ${section}`,
          })),
        ]}
        onChange={(event) => {
          setAbout(event.target.value);
          setProblem(undefined);
        }}
      />
      {about === TYPED && (
        <Field
          label="The words, as they stand in the report"
          value={words}
          error={problem}
          onChange={(event) => {
            setWords(event.target.value);
            setProblem(undefined);
          }}
        />
      )}
    </NoteForm>
  );
}

function shorten(words: string): string {
  return words.length > SHORT ? `${words.slice(0, SHORT)}…` : words;
}
