import type { Level, SectionName } from '#shared/contracts/teams.ts';
import { classNames } from '#src/lib/class-names.ts';
import { levelShare } from './level.ts';

const BOTTOM = 42;
const RISE = 37;

function Tube({ level }: { readonly level: Level }) {
  const surface = BOTTOM - levelShare(level) * RISE;
  return (
    <svg width="26" height="46" viewBox="0 0 26 46" aria-hidden="true" className="-ml-[3px]">
      {level !== 'Blank' && (
        <>
          <path d={`M4 ${surface}H22V37a5 5 0 0 1-5 5H9a5 5 0 0 1-5-5z`} fill="var(--color-water-fill)" />
          <path d={`M4 ${surface}H22`} stroke="var(--color-water)" strokeWidth="2" />
        </>
      )}
      <path
        d="M4 2V37a5 5 0 0 0 5 5h8a5 5 0 0 0 5-5V2"
        fill="none"
        stroke="var(--color-ink-2)"
        strokeWidth="1.5"
        strokeLinecap="round"
      />
      <path d="M17.5 32.75H22M17.5 23.5H22M17.5 14.25H22" stroke="var(--color-ink-2)" strokeWidth="1.2" />
    </svg>
  );
}

interface LevelGaugeProps {
  readonly levels: readonly { readonly section: SectionName; readonly level: Level }[];
  /** Say each section above its level, where no table head does. */
  readonly named?: boolean;
}

/** Five tubes on one foot; the first lowest is the section to work on. */
export function LevelGauge({ levels, named = false }: LevelGaugeProps) {
  const lowest = Math.min(...levels.map(({ level }) => levelShare(level)));
  const first = levels.findIndex(({ level }) => levelShare(level) === lowest);
  return (
    <ol
      className={classNames(
        'relative grid',
        named
          ? 'grid-cols-5 gap-y-2 max-[360px]:grid-cols-4'
          : 'grid-cols-5 after:absolute after:top-[43px] after:left-2.5 after:w-[80%] after:border-b-[1.5px] after:border-ink-2',
      )}
    >
      {levels.map(({ section, level }, index) => (
        <li key={section} className="min-w-0 text-xs text-ink-2">
          <Tube level={level} />
          <span className={named ? 'mt-[3px] block text-2xs tracking-[-.015em] text-ink-3' : 'sr-only'}>
            {section}
          </span>
          <span className={classNames('block', !named && 'mt-0.5', index === first && 'font-[650] text-ink')}>
            {level}
          </span>
        </li>
      ))}
    </ol>
  );
}
