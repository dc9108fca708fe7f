import { useState, type ReactNode } from 'react';
import { Link } from 'react-router-dom';
import { Sheet } from '#src/components/sheet.tsx';
import { classNames } from '#src/lib/class-names.ts';
import { Cup } from './cup.tsx';
import type { StationWord } from './station.ts';
import { ThemeWord } from './theme-word.tsx';

const ROW = 'flex min-h-14 w-full items-center justify-between border-b border-hair text-left text-report';

interface StationsSheetProps {
  readonly label: string;
  readonly stations: readonly StationWord[];
  /** Where else one can go from here. */
  readonly others: readonly { readonly to: string; readonly words: string }[];
  /** What is said at the right of the line on a wide screen. */
  readonly aside: ReactNode;
}

/** On a phone one word, with its cup, opens the stations from the bottom. */
export function StationsSheet({ label, stations, others, aside }: StationsSheetProps) {
  const [isOpen, setOpen] = useState(false);
  const here = stations.find(({ isHere }) => isHere);
  const close = () => setOpen(false);
  return (
    <div className="relative ml-auto flex sm:hidden">
      <button
        type="button"
        aria-haspopup="dialog"
        aria-expanded={isOpen}
        onClick={() => setOpen(true)}
        className="relative h-14 px-3.5 font-[650]"
      >
        {here?.words ?? 'Stations'}
        {here?.cup && <Cup words={here.cup} />}
      </button>
      <Sheet open={isOpen} onClose={close} title={label} isTitleHidden>
        <nav aria-label={label}>
          {stations.map(({ to, words, isHere, cup }) => (
            <Link
              key={to}
              to={to}
              onClick={close}
              aria-current={isHere ? 'page' : undefined}
              className={classNames(ROW, isHere && 'font-[650]')}
            >
              {words}
              {cup !== null && <span className="text-xs font-normal text-ink-2">{cup}</span>}
            </Link>
          ))}
          {others.map(({ to, words }) => (
            <Link key={to} to={to} onClick={close} className={classNames(ROW, 'text-base text-ink-2')}>
              {words}
            </Link>
          ))}
        </nav>
        <ThemeWord className={classNames(ROW, 'text-base text-ink-2')} />
        <div className="pt-4 text-xs text-ink-2">{aside}</div>
      </Sheet>
    </div>
  );
}
