import { useId, type CSSProperties, type ReactNode } from 'react';
import type { Hue } from '#shared/evidence/findings.ts';

export interface ListedOption {
  readonly key: string;
  readonly words: string;
  /** At the right, in its hue. */
  readonly text?: string;
  readonly hue?: Hue;
}

const HUES = {
  measured: 'text-measured',
  predicted: 'text-predicted',
  difference: 'text-difference',
  count: 'text-ink',
} as const;

export const optionId = (list: string, index: number) => `${list}-option-${index}`;

/** A short list that lies on the page: arrows move, Enter or a press takes. The keys are handled by who has the focus. */
export function ListAtPlace<Option extends ListedOption>({
  id,
  label,
  question,
  options,
  active,
  place,
  onTake,
  children,
}: {
  readonly id: string;
  readonly label: string;
  readonly question?: ReactNode;
  readonly options: readonly Option[];
  readonly active: number;
  readonly place: CSSProperties;
  readonly onTake: (option: Option) => void;
  readonly children?: ReactNode;
}) {
  const questionId = useId();
  return (
    <div
      className="rises absolute z-[8] w-[386px] max-w-[calc(100vw-32px)] rounded-sm bg-paper py-1.5 font-ui shadow-card"
      style={place}
    >
      {question && (
        <p id={questionId} className="px-4.5 pb-1 text-xs text-ink-3">
          {question}
        </p>
      )}
      {children}
      <ul role="listbox" id={id} aria-label={label} className="max-h-72 overflow-y-auto">
        {options.map((option, index) => (
          <li
            key={option.key}
            id={optionId(id, index)}
            role="option"
            aria-selected={index === active}
            className={`grid cursor-pointer grid-cols-[1fr_auto] items-baseline gap-4 px-4.5 py-[5px] text-base ${index === active ? 'font-semibold shadow-[inset_3px_0_0_var(--color-ink)]' : ''}`}
            onMouseDown={(event) => {
              // The caret stays where it is.
              event.preventDefault();
              onTake(option);
            }}
          >
            <span>{option.words}</span>
            {option.text && (
              <b className={`font-report text-[16px] font-medium ${HUES[option.hue ?? 'count']}`}>
                {option.text}
              </b>
            )}
          </li>
        ))}
        {options.length === 0 && <li className="px-4.5 py-[5px] text-sm text-ink-3">Nothing fits.</li>}
      </ul>
    </div>
  );
}
