import type { Editor } from '@tiptap/react';
import { useMemo, useRef, useState, type KeyboardEvent } from 'react';
import { uploadPlate } from '#shared/contracts/report.ts';
import { call } from '#src/lib/api/call.ts';
import { sentenceOf } from '#src/lib/api/api-error.ts';
import { useFindingsSnapshot } from '#src/lib/evidence/use-evidence.ts';
import { useProblem } from '#src/lib/problem/problem-context.ts';
import { say } from '#src/lib/sill-store.ts';
import { putIn } from '../editor/put-in.ts';
import { ListAtPlace, optionId } from './list-at-place.tsx';
import { KINDS, putInOptions, type Kind, type PutInOption } from './put-in-options.ts';

const LIST = 'put-in-list';

/** The words of the sill: arrows go from one to the next, Enter opens what can be put in. */
export function PutInWords({ editor }: { readonly editor: Editor }) {
  const { address } = useProblem();
  const [open, setOpen] = useState<Exclude<Kind, 'Plate'> | null>(null);
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
      {open && <PutInList key={open} kind={open} editor={editor} onClose={() => setOpen(null)} />}
    </div>
  );
}

function PutInList({
  kind,
  editor,
  onClose,
}: {
  readonly kind: Exclude<Kind, 'Plate'>;
  readonly editor: Editor;
  readonly onClose: () => void;
}) {
  const { evidence, findings } = useFindingsSnapshot();
  const [wanted, setWanted] = useState('');
  const [active, setActive] = useState(0);
  const all = useMemo(
    () => putInOptions(kind, editor, evidence, findings),
    [kind, editor, evidence, findings],
  );
  const options = all.filter(({ words }) => words.toLowerCase().includes(wanted.toLowerCase())).slice(0, 60);
  const take = (option: PutInOption) => {
    onClose();
    option.run();
  };
  return (
    <ListAtPlace
      id={LIST}
      label={`${kind}, which?`}
      options={options}
      active={active}
      place={{ bottom: 44, left: 40 }}
      onTake={take}
    >
      <div className="px-4.5 pt-1 pb-2">
        <input
          // It opened at one's press: one types on at once.
          ref={(field) => field?.focus()}
          role="combobox"
          aria-label={`${kind}, which?`}
          aria-expanded="true"
          aria-controls={LIST}
          aria-activedescendant={optionId(LIST, active)}
          placeholder={`${kind}, which?`}
          className="h-9 w-full rounded-md border-[1.25px] border-edge bg-paper px-2.5 text-sm outline-none focus:border-ink"
          value={wanted}
          onChange={(event) => {
            setWanted(event.target.value);
            setActive(0);
          }}
          onBlur={onClose}
          onKeyDown={(event) => {
            event.stopPropagation();
            const count = Math.max(1, options.length);
            const option = options[active];
            if (event.key === 'ArrowDown') setActive((active + 1) % count);
            else if (event.key === 'ArrowUp') setActive((active + count - 1) % count);
            else if (event.key === 'Enter' && option) take(option);
            else if (event.key === 'Escape') {
              onClose();
              editor.commands.focus();
            } else return;
            event.preventDefault();
          }}
        />
      </div>
    </ListAtPlace>
  );
}
