import type { Editor } from '@tiptap/react';
import { useMemo, useState } from 'react';
import { useFindingsSnapshot } from '#src/lib/evidence/use-evidence.ts';
import { ListAtPlace, optionId } from './list-at-place.tsx';
import { putInOptions, type Kind, type PutInOption } from './put-in-options.ts';

const LIST = 'put-in-list';

/** What can be put in of one kind: typing narrows it, arrows and Enter take one. */
export function PutInList({
  kind,
  editor,
  onClose,
  askLink,
}: {
  readonly kind: Exclude<Kind, 'Plate'>;
  readonly editor: Editor;
  readonly onClose: () => void;
  readonly askLink: () => void;
}) {
  const { evidence, findings } = useFindingsSnapshot();
  const [wanted, setWanted] = useState('');
  const [active, setActive] = useState(0);
  const all = useMemo(
    () => putInOptions(kind, editor, askLink, evidence, findings),
    [kind, editor, askLink, evidence, findings],
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
