import type { KeptEvent } from '#shared/contracts/fights.ts';
import { Word } from '#src/components/word.tsx';
import { FLOOR_WORDS, minutesSentence, ruleSentences } from '../sentences/event-words.ts';

interface EventRowProps {
  readonly event: KeptEvent;
  /** null: who reads may not change it. */
  readonly onChange: (() => void) | null;
}

/** An event: its blocks drawn on one scale of minutes, and its rules in words. */
export function EventRow({ event, onChange }: EventRowProps) {
  const end = Math.max(...event.blocks.map(({ to }) => to));
  return (
    <div className="py-4">
      <div className="flex flex-wrap items-baseline justify-between gap-x-6">
        <h3 className="font-report text-[21px]/7 font-medium">{event.name}</h3>
        {onChange && (
          <Word onClick={onChange}>
            Change<span className="sr-only"> {event.name}</span>
          </Word>
        )}
      </div>
      <p className="font-report text-[17px]/[26px] text-ink-2">
        {minutesSentence(event)} {event.note}
      </p>
      <div className="grid gap-x-10 gap-y-4 pt-3 lg:grid-cols-[1fr_360px]">
        <table className="w-full border-collapse text-sm">
          <thead>
            <tr className="border-b-[1.25px] border-ink text-left text-xs text-ink-2">
              <th scope="col" className="py-1.5 pr-3 font-normal">
                Block
              </th>
              <th scope="col" className="py-1.5 pr-3 font-normal">
                Has the floor
              </th>
              <th scope="col" className="py-1.5 pr-3 text-right font-normal">
                Minutes
              </th>
              <th scope="col" className="w-2/5 py-1.5 font-normal max-sm:hidden">
                <span className="sr-only">Drawn on one scale</span>
              </th>
            </tr>
          </thead>
          <tbody>
            {event.blocks.map(({ name, floor, from, to, isReport }) => (
              <tr key={`${from} ${name}`} className="border-b border-hair">
                <th
                  scope="row"
                  className={
                    isReport ? 'py-1.5 pr-3 text-left font-[650]' : 'py-1.5 pr-3 text-left font-normal'
                  }
                >
                  {name}
                </th>
                <td className="py-1.5 pr-3 text-ink-2">{FLOOR_WORDS[floor]}</td>
                <td className="py-1.5 pr-3 text-right whitespace-nowrap">
                  {from}–{to}
                </td>
                <td className="py-1.5 max-sm:hidden">
                  <div aria-hidden="true" className="relative h-3 border-b-[1.25px] border-ink-3">
                    <div
                      className="absolute inset-y-0 border-t-2 border-water bg-water-fill"
                      style={{ left: `${(100 * from) / end}%`, width: `${(100 * (to - from)) / end}%` }}
                    />
                  </div>
                </td>
              </tr>
            ))}
          </tbody>
        </table>
        <ul className="grid content-start gap-1.5 text-base text-ink-2">
          {ruleSentences(event).map((sentence) => (
            <li key={sentence}>{sentence}</li>
          ))}
        </ul>
      </div>
    </div>
  );
}
