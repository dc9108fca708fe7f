import type { ReactNode } from 'react';
import { Link } from 'react-router-dom';
import { Mark } from '#src/components/mark.tsx';
import { PhoneConnection } from './connection-words.tsx';
import { KeysSlip } from './keys-slip.tsx';
import { StationLine } from './station-line.tsx';
import type { StationWord } from './station.ts';
import { StationsSheet } from './stations-sheet.tsx';
import { ThemeWord } from './theme-word.tsx';

const WORDS = 'min-h-6 text-left text-xs font-medium text-ink-2 hover:text-ink';

interface TopLineProps {
  /** Where the name leads. */
  readonly home: string;
  readonly small: string;
  readonly name: string;
  readonly label: string;
  readonly stations: readonly StationWord[];
  readonly others: readonly { readonly to: string; readonly words: string }[];
  /** Two lines at the right. */
  readonly aside: ReactNode;
}

/** Who and where at the left, the stations in the middle, what comes next and who is here at the right. */
export function TopLine({ home, small, name, label, stations, others, aside }: TopLineProps) {
  return (
    <>
      <header
        data-chrome
        className="relative z-5 flex min-h-[60px] items-stretch border-b border-rule bg-paper px-6 max-md:flex-wrap max-sm:sticky max-sm:top-0 max-sm:min-h-14 max-sm:flex-nowrap max-sm:pr-2 max-sm:pl-3.5"
      >
        <Link
          to={home}
          className="flex min-w-0 items-center gap-3 max-md:flex-1 max-md:py-2 max-sm:gap-2.5 max-sm:py-0 md:min-w-[260px]"
        >
          <Mark size={30} />
          <span className="min-w-0">
            <span className="block text-2xs/[15px] text-ink-3">{small}</span>
            <span className="line-clamp-2 max-w-[400px] font-report text-[17px]/[21px] font-semibold max-sm:line-clamp-1">
              {name}
            </span>
          </span>
        </Link>
        <StationLine label={label} stations={stations} />
        <div className="flex items-center justify-end gap-5 max-md:order-2 max-sm:hidden md:min-w-[260px]">
          <span className="text-right text-xs/[17px] text-ink-2">{aside}</span>
          <span className="grid gap-px">
            <KeysSlip className={WORDS} />
            <ThemeWord className={WORDS} />
          </span>
        </div>
        <StationsSheet label={label} stations={stations} others={others} aside={aside} />
      </header>
      <PhoneConnection />
    </>
  );
}
