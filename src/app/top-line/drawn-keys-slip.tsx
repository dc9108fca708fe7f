import { Dialog } from 'radix-ui';
import type { ReactNode, RefObject } from 'react';
import { Word } from '#src/components/word.tsx';
import { STATIONS } from '#src/lib/paths.ts';
import { digitKeys } from '#src/lib/preferences/digit-keys.ts';
import { useStore } from '#src/lib/store/use-store.ts';

const KEYS: readonly (readonly [key: ReactNode, does: string])[] = [
  [`1 to ${STATIONS.length}`, 'the stations, in their order'],
  ['0', 'the Season'],
  ['F6', 'from the page to the entry bar or the sill; with Shift, back'],
  [
    <>
      <i>R</i> ±
    </>,
    'ties a value; +- will do for ±',
  ],
  ['arrows', 'choose on the sill and in lists'],
  ['Enter', 'puts in, opens a number; on the trials, goes to the entry bar'],
  ['Escape', 'closes what lies on top'],
];

interface DrawnKeysSlipProps {
  /** The word that opened it; it gets the focus back, and pressing it again closes. */
  readonly word: RefObject<HTMLButtonElement | null>;
  readonly onClose: () => void;
}

/** What the slip of keys draws once it is open. */
export function DrawnKeysSlip({ word, onClose }: DrawnKeysSlipProps) {
  const areDigitsOn = useStore(digitKeys) === 'on';
  return (
    <Dialog.Root open modal={false} onOpenChange={(isOpen) => !isOpen && onClose()}>
      <Dialog.Portal>
        <Dialog.Content
          aria-describedby={undefined}
          onInteractOutside={(event) => {
            if (event.target instanceof Node && word.current?.contains(event.target)) event.preventDefault();
          }}
          onEscapeKeyDown={() => word.current?.focus()}
          onCloseAutoFocus={(event) => event.preventDefault()}
          className="rises fixed top-[60px] right-6 z-[7] max-h-[calc(100dvh-80px)] w-[min(392px,calc(100vw-48px))] overflow-y-auto rounded-b-md bg-paper px-[26px] py-5 shadow-card"
        >
          <Dialog.Title className="mb-1.5 font-report text-[22px]/7 font-medium">Keys</Dialog.Title>
          <dl className="grid grid-cols-[104px_1fr] border-t-[1.25px] border-ink text-sm">
            {KEYS.map(([key, does]) => (
              <div key={does} className="contents">
                <dt className="border-b border-hair py-2 font-report text-[17px]/5 font-medium">{key}</dt>
                <dd className="border-b border-hair py-2 text-ink-2">{does}</dd>
              </div>
            ))}
          </dl>
          <p className="mt-3 font-report text-base text-ink-2">
            The digits act only when no field has the focus. They are {areDigitsOn ? 'on' : 'off'}.
            <Word
              className="ml-1.5 font-ui text-sm"
              onClick={() => digitKeys.set(areDigitsOn ? 'off' : 'on')}
            >
              Switch {areDigitsOn ? 'off' : 'on'}
            </Word>
          </p>
        </Dialog.Content>
      </Dialog.Portal>
    </Dialog.Root>
  );
}
