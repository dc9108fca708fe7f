import { Dialog as Radix } from 'radix-ui';
import type { ReactNode } from 'react';
import { Scrim } from './scrim.tsx';

interface DialogProps {
  readonly open: boolean;
  /** The safe choice: Escape and a press outside do it. */
  readonly onClose: () => void;
  /** The question. */
  readonly title: ReactNode;
  /** The consequence, in numbers where there are any. */
  readonly sentence?: ReactNode;
  /** The safe choice first, then the other; null where the content has them. */
  readonly actions: ReactNode;
  readonly children?: ReactNode;
}

/** Only to exclude, freeze, lend, take back or remove, and to sign in again. */
export function Dialog({ open, onClose, title, sentence, actions, children }: DialogProps) {
  return (
    <Radix.Root open={open} onOpenChange={(isOpen) => !isOpen && onClose()}>
      <Radix.Portal>
        <Scrim />
        <Radix.Content
          {...(sentence === undefined ? { 'aria-describedby': undefined } : {})}
          className="rises fixed top-1/2 left-1/2 z-20 max-h-[calc(100dvh-32px)] w-[min(460px,calc(100vw-32px))] -translate-1/2 overflow-y-auto rounded-md bg-paper px-6 pt-[22px] pb-5 shadow-card"
        >
          <Radix.Title className="mb-1.5 font-report text-[21px]/7 font-medium">{title}</Radix.Title>
          {sentence !== undefined && (
            <Radix.Description className="mb-3.5 text-sm/[21px] text-ink-2">{sentence}</Radix.Description>
          )}
          {children}
          {actions !== null && (
            <div className="mt-4.5 flex flex-wrap items-center justify-end gap-2.5">{actions}</div>
          )}
        </Radix.Content>
      </Radix.Portal>
    </Radix.Root>
  );
}
