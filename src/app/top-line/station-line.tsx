import { Link } from 'react-router-dom';
import { classNames } from '#src/lib/class-names.ts';
import { Cup } from './cup.tsx';
import type { StationWord } from './station.ts';

interface StationLineProps {
  readonly label: string;
  readonly stations: readonly StationWord[];
}

/** The stations as words; the current one holds the cup. */
export function StationLine({ label, stations }: StationLineProps) {
  return (
    <nav
      aria-label={label}
      className="mx-auto flex justify-center gap-1.5 max-md:order-3 max-md:-mx-2 max-md:w-[calc(100%+16px)] max-md:justify-between max-sm:hidden"
    >
      {stations.map(({ to, words, isHere, cup }) => (
        <Link
          key={to}
          to={to}
          aria-current={isHere ? 'page' : undefined}
          className={classNames(
            'relative flex items-center px-4 max-md:h-[46px]',
            isHere ? 'font-[650] text-ink' : 'font-medium text-ink-2',
          )}
        >
          {words}
          {isHere && cup !== null && <Cup words={cup} />}
        </Link>
      ))}
    </nav>
  );
}
