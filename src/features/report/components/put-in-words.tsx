import type { Editor } from '@tiptap/react';
import { useRef, useState, type KeyboardEvent } from 'react';
import { uploadPlate } from '#shared/contracts/report.ts';
import { call } from '#src/lib/api/call.ts';
import { sentenceOf } from '#src/lib/api/api-error.ts';
import { useProblem } from '#src/lib/problem/problem-context.ts';
import { say } from '#src/lib/sill-store.ts';
import { putIn } from '../editor/put-in.ts';
import { LinkField } from './link-field.tsx';
import { PutInList } from './put-in-list.tsx';
import { KINDS, type Kind } from './put-in-options.ts';

/** The words of the sill: arrows go from one to the next, Enter opens what can be put in. */
export function PutInWords({ editor }: { readonly editor: Editor }) {
  const { address } = useProblem();
  const [open, setOpen] = useState<Exclude<Kind, 'Plate'> | null>(null);
  const [asksLink, setAsksLink] = useState(false);
  const words = useRef<HTMLDivElement>(null);
  const file = useRef<HTMLInputElement>(null);

  async function addPlate(chosen: File): Promise<void> {
    say(`${chosen.name} is on its way.`);
    const body = new FormData();
    body.set('file', chosen);
    try {
      const plate = await call(uploadPlate, { params: { ...address }, body });
      putIn.plate(editor, plate);
      say('The plate stands at the caret. Say what it shows.');
    } catch (error) {
      say(sentenceOf(error));
    }
  }

  function walk(event: KeyboardEvent): void {
    const step = event.key === 'ArrowRight' ? 1 : event.key === 'ArrowLeft' ? -1 : 0;
    if (step === 0) return;
    const buttons = [...(words.current?.querySelectorAll<HTMLButtonElement>('button[data-kind]') ?? [])];
    const index = buttons.findIndex((button) => button === document.activeElement);
    if (index < 0) return;
    event.preventDefault();
    buttons[(index + step + buttons.length) % buttons.length]?.focus();
  }

  return (
    <div
      ref={words}
      role="toolbar"
      aria-label="Put in"
      tabIndex={-1}
      className="relative flex items-center"
      onKeyDown={walk}
    >
      <span className="mr-2 text-xs text-ink-3">Put in</span>
      {KINDS.map((kind, index) => (
        <button
          key={kind}
          type="button"
          data-kind={kind}
          {...(index === 0 ? { 'data-region-start': true } : {})}
          aria-haspopup={kind === 'Plate' ? undefined : 'listbox'}
          aria-expanded={kind === 'Plate' ? undefined : open === kind}
          className={`relative h-9 px-2.5 font-[550] ${open === kind ? 'sill-cup' : ''}`}
          onClick={() => (kind === 'Plate' ? file.current?.click() : setOpen(open === kind ? null : kind))}
        >
          {kind}
        </button>
      ))}
      <input
        ref={file}
        type="file"
        accept="image/*"
        className="hidden"
        aria-label="Picture of the plate"
        onChange={(event) => {
          const [chosen] = event.target.files ?? [];
          if (chosen) void addPlate(chosen);
          event.target.value = '';
        }}
      />
      {open && (
        <PutInList
          key={open}
          kind={open}
          editor={editor}
          onClose={() => setOpen(null)}
          askLink={() => setAsksLink(true)}
        />
      )}
      {asksLink && <LinkField editor={editor} onClose={() => setAsksLink(false)} />}
    </div>
  );
}
