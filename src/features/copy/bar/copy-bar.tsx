import { getCopyPdf, type OpenCopy } from '#shared/contracts/copies.ts';
import { Mark } from '#src/components/mark.tsx';
import { Seal } from '#src/components/seal.tsx';
import { addressOf } from '#src/lib/api/address-of.ts';
import { dayAndMonth, timeOfDay, weekdayDayAndMonth } from '#src/lib/dates/say-date.ts';
import { countOf } from '#src/lib/say/count-of.ts';

interface CopyBarProps {
  readonly copy: OpenCopy;
  /** null: the captain looks at what the reader will see. */
  readonly token: string | null;
}

/** The ink bar of a lent copy: what it is, that it cannot change, and to whom it is lent until when. */
export function CopyBar({ copy, token }: CopyBarProps) {
  const { view, recipient, reader, until, mayPrint } = copy;
  const { edition, problem, team } = view;
  const at = new Date(edition.at);
  const words = 'inline-flex min-h-6 items-center border-b border-current font-[550] whitespace-nowrap';
  return (
    <header className="copy-bar" data-chrome>
      <div className="flex min-w-0 items-center gap-3.5">
        <Mark size={30} />
        <span className="min-w-0">
          <b className="block font-report text-[19px]/6 font-medium">{problem.title}</b>
          <small className="block text-xs opacity-85">reported by {team.name}</small>
        </span>
      </div>
      <div className="flex min-w-0 items-center gap-3.5 text-sm">
        <Seal n={edition.n} seal={edition.seal} size={56} className="flex-none max-sm:size-11" />
        <span className="min-w-0">
          <b className="block text-base/5 font-[650]">
            {reader === 'opponent' ? 'Opponent' : 'Reviewer'} copy, edition {edition.n}
          </b>
          <span className="block opacity-85">
            frozen {weekdayDayAndMonth(at)}, {timeOfDay(at)}. Read-only.
          </span>
        </span>
      </div>
      <div className="flex flex-wrap items-center gap-x-6 gap-y-1 text-sm md:justify-end md:text-right">
        <a href="#trials" className={words}>
          {countOf(view.trials, 'trial')}
        </a>
        {mayPrint && token !== null && (
          <a href={addressOf(getCopyPdf.path, { token })} className={words}>
            Print
          </a>
        )}
        <span>
          Lent to <b className="font-[650]">{recipient}</b>
          <br />
          <span className="opacity-85">until {dayAndMonth(new Date(until))}</span>
        </span>
      </div>
    </header>
  );
}
