import { DropdownMenu } from 'radix-ui';
import type { ReactNode } from 'react';
import { classNames } from '#src/lib/class-names.ts';

export interface MenuItem {
  readonly words: string;
  readonly onSelect: () => void;
  readonly isRisk?: boolean;
  readonly disabled?: boolean;
}

interface MenuProps {
  /** A button that says what it opens. */
  readonly trigger: ReactNode;
  readonly items: readonly MenuItem[];
  readonly align?: 'start' | 'end';
}

/** A short list of actions at the place where it was asked for. */
export function Menu({ trigger, items, align = 'start' }: MenuProps) {
  return (
    <DropdownMenu.Root modal={false}>
      <DropdownMenu.Trigger asChild>{trigger}</DropdownMenu.Trigger>
      <DropdownMenu.Portal>
        <DropdownMenu.Content
          align={align}
          sideOffset={4}
          className="rises z-20 min-w-44 rounded-md bg-paper py-1.5 text-sm shadow-card"
        >
          {items.map(({ words, onSelect, isRisk, disabled }) => (
            <DropdownMenu.Item
              key={words}
              onSelect={onSelect}
              disabled={disabled}
              className={classNames(
                'cursor-pointer px-4 py-2 outline-none data-disabled:opacity-50 data-highlighted:bg-sill',
                isRisk && 'text-leak',
              )}
            >
              {words}
            </DropdownMenu.Item>
          ))}
        </DropdownMenu.Content>
      </DropdownMenu.Portal>
    </DropdownMenu.Root>
  );
}
