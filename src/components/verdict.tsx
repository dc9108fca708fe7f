import type { Verdict } from '#shared/evidence/findings.ts';
import { classNames } from '#src/lib/class-names.ts';

const HUES = { Holds: 'text-water', Leaks: 'text-leak', Undecided: 'text-ink-2' } as const;

/** Full, with a hole and a drop, or with a dashed line: the vessel of a verdict. */
export function VerdictVessel({ verdict, size = 21 }: { readonly verdict: Verdict; readonly size?: number }) {
  const line = { fill: 'none', stroke: 'currentColor', strokeWidth: 1.5, strokeLinecap: 'round' } as const;
  return (
    <svg width={size} height={size} viewBox="0 0 16 16" aria-hidden="true" className="flex-none">
      {verdict === 'Holds' && (
        <>
          <path
            d="M3.2 6.2V11A2.6 2.6 0 0 0 5.8 13.6h4.4A2.6 2.6 0 0 0 12.8 11V6.2z"
            fill="currentColor"
            opacity=".45"
          />
          <path d="M3.2 2.2V11a2.6 2.6 0 0 0 2.6 2.6h4.4A2.6 2.6 0 0 0 12.8 11V2.2M3.2 6h9.6" {...line} />
        </>
      )}
      {verdict === 'Leaks' && (
        <>
          <path
            d="M2.2 2.2V11a2.6 2.6 0 0 0 2.6 2.6h3.4A2.6 2.6 0 0 0 10.8 11v-.6M10.8 2.2v4.6M2.2 8.4h8.2"
            {...line}
          />
          <path d="M11.2 8.6c1.9.1 3 1.3 3.2 3.4" {...line} />
          <circle cx="14.5" cy="14.3" r="1" fill="currentColor" />
        </>
      )}
      {verdict === 'Undecided' && (
        <>
          <path d="M3.2 2.2V11a2.6 2.6 0 0 0 2.6 2.6h4.4A2.6 2.6 0 0 0 12.8 11V2.2" {...line} />
          <path d="M4.6 7.6h1.6M7.2 7.6h1.6M9.8 7.6h1.6" stroke="currentColor" strokeWidth={1.5} />
        </>
      )}
    </svg>
  );
}

interface VerdictMarkProps {
  readonly verdict: Verdict;
  /** 21 in text, 27 on the claim sheet, 18 in tight rows. */
  readonly size?: 18 | 21 | 27;
}

/** A vessel and its word, without ground or outline. */
export function VerdictMark({ verdict, size = 21 }: VerdictMarkProps) {
  return (
    <span
      className={classNames(
        'inline-flex items-center gap-[7px] font-semibold whitespace-nowrap',
        size === 18 ? 'text-sm' : 'text-base',
        HUES[verdict],
      )}
    >
      <VerdictVessel verdict={verdict} size={size} />
      {verdict}
    </span>
  );
}

interface VerdictCountProps {
  readonly holds: number;
  readonly leaks: number;
  readonly undecided: number;
}

/** Claims by verdict in a row: the words are there for screen readers and on pointing. */
export function VerdictCount({ holds, leaks, undecided }: VerdictCountProps) {
  const counts = [
    ['Holds', holds, holds === 1 ? 'holds' : 'hold'],
    ['Leaks', leaks, leaks === 1 ? 'leaks' : 'leak'],
    ['Undecided', undecided, 'undecided'],
  ] as const;
  return (
    <span className="flex gap-3 text-sm font-semibold max-sm:gap-[9px]">
      {counts.map(([verdict, count, words]) => (
        <span
          key={verdict}
          title={`${count} ${words}`}
          className={classNames(
            'flex items-center gap-[5px] max-sm:gap-1',
            count === 0 ? 'font-normal text-ink-3' : HUES[verdict],
          )}
        >
          <VerdictVessel verdict={verdict} size={16} />
          {count}
          <span className="sr-only">
            {' '}
            {words}
            {verdict === 'Undecided' ? '' : ', '}
          </span>
        </span>
      ))}
    </span>
  );
}
