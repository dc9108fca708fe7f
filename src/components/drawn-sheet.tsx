import { Dialog as Radix } from 'radix-ui';
import { Button } from './button.tsx';
import { Scrim } from './scrim.tsx';
import type { SheetProps } from './sheet.tsx';

/** What a sheet draws once it is open. */
export function DrawnSheet({ onClose, title, isTitleHidden = false, children }: Omit<SheetProps, 'open'>) {
  return (
    <Radix.Root open onOpenChange={(isOpen) => !isOpen && onClose()}>
      <Radix.Portal>
        <Scrim />
        <Radix.Content
          aria-describedby={undefined}
          className="slides-up fixed inset-x-0 bottom-0 z-20 max-h-[85dvh] overflow-y-auto rounded-t-lg bg-paper px-5 pt-4 pb-[max(20px,env(safe-area-inset-bottom))] shadow-card"
        >
          <div className="flex items-center justify-between gap-4">
            <Radix.Title className={isTitleHidden ? 'sr-only' : 'font-report text-[21px]/7 font-medium'}>
              {title}
            </Radix.Title>
            <Radix.Close asChild>
              <Button kind="plain" className="-mr-2 ml-auto min-h-12">
                Close
              </Button>
            </Radix.Close>
          </div>
          {children}
        </Radix.Content>
      </Radix.Portal>
    </Radix.Root>
  );
}
