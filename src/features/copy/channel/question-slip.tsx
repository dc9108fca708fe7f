import { useState } from 'react';
import type { Question, QuestionAbout } from '#shared/contracts/copy-questions.ts';
import { sayTime } from './say-time.ts';
import { SlipWall } from './slip-wall.tsx';
import { useSlipDrag } from './use-slip-drag.ts';

interface QuestionSlipProps {
  readonly question: Question;
  readonly number: number;
  /** Seconds that the whole channel stands for. */
  readonly whole: number;
  readonly isWide: boolean;
  readonly isOpen: boolean;
  readonly onOpen: () => void;
  readonly onAbout: (about: QuestionAbout) => void;
  readonly onSeconds: (seconds: number) => void;
  readonly onDrop: (place: number) => void;
}

/** One question: its text opens it, its wall sets its time, and it can be dragged to another place. */
export function QuestionSlip({
  question,
  number,
  whole,
  isWide,
  isOpen,
  onOpen,
  onAbout,
  onSeconds,
  onDrop,
}: QuestionSlipProps) {
  const [moved, setMoved] = useState<number | null>(null);
  const { by, wasDragged, handlers } = useSlipDrag(onDrop);
  const { text, about, seconds } = question;
  const shown = moved ?? seconds;
  return (
    <li
      className="ask-slip"
      data-open={isOpen || undefined}
      data-dragged={by !== null || undefined}
      style={isWide ? { width: `${(100 * shown) / whole}%`, translate: `${by ?? 0}px` } : undefined}
      {...(isWide ? handlers : {})}
    >
      <button
        type="button"
        className="ask-text"
        aria-label={`Question ${number}: ${text}. Change it`}
        title={text}
        onClick={() => !wasDragged() && onOpen()}
      >
        <span className="mr-2 font-normal text-ink-3">{number}</span>
        {text}
      </button>
      <p className="ask-about">
        {about ? (
          <button
            type="button"
            className="min-h-6 truncate text-left hover:underline"
            onClick={() => onAbout(about)}
          >
            {about.kind === 'passage' ? `“${about.quote}”` : about.words}
          </button>
        ) : (
          <span />
        )}
        <span className="flex-none">{sayTime(shown)}</span>
      </p>
      {isWide ? (
        <SlipWall
          number={number}
          seconds={seconds}
          whole={whole}
          onMove={setMoved}
          onSettle={(next) => {
            setMoved(null);
            if (next !== seconds) onSeconds(next);
          }}
        />
      ) : (
        <span className="ask-share" style={{ width: `${(100 * seconds) / whole}%` }} aria-hidden="true" />
      )}
    </li>
  );
}
