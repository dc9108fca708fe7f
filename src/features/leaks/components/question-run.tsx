import { useEffect, useRef, useState } from 'react';
import type { PreparedLeak } from '#shared/leaks/prepared-leak.ts';
import { Button } from '#src/components/button.tsx';
import { SentenceText } from '#src/components/sentence-text.tsx';
import { Word } from '#src/components/word.tsx';
import { useEvidence } from '#src/lib/evidence/use-evidence.ts';

/** Seconds to answer one question: what a stage allows. */
const SECONDS = 30;

type Asked = Exclude<PreparedLeak, { readonly state: 'mended' }>;

/** The questions one by one, the hardest first, each with half a minute. */
export function QuestionRun({
  leaks,
  onEnd,
}: {
  readonly leaks: readonly Asked[];
  readonly onEnd: () => void;
}) {
  const evidence = useEvidence();
  const [at, setAt] = useState(0);
  const [isShown, setShown] = useState(false);
  const [left, restart] = useSecondsLeft();
  const question = useRef<HTMLHeadingElement>(null);
  const asked = leaks[at];
  useEffect(() => question.current?.focus(), [at]);
  if (!asked) return null;
  const isLast = at === leaks.length - 1;
  const goOn = () => {
    if (isLast) return onEnd();
    setAt(at + 1);
    setShown(false);
    restart();
  };
  return (
    <section aria-label="Dry run of the questions" className="mt-10 max-w-[820px]">
      <p className="text-sm text-ink-2">
        Question {at + 1} of {leaks.length}
      </p>
      <h2
        ref={question}
        tabIndex={-1}
        className="mt-2 font-report text-[30px]/[38px] font-medium text-balance outline-none"
      >
        <SentenceText text={asked.leak.question} symbols={evidence.quantities.map(({ symbol }) => symbol)} />
      </h2>
      <Clock left={left} />
      {isShown && (
        <p className="mt-5 font-report text-report">
          {asked.answer ? (
            <>
              <span className="text-ink-3">–</span> {asked.answer.text}
            </>
          ) : (
            'No answer is prepared yet.'
          )}
        </p>
      )}
      <div className="mt-6 flex flex-wrap items-center gap-x-5 gap-y-3">
        <Button kind="main" onClick={goOn}>
          {isLast ? 'End' : 'Next question'}
        </Button>
        {!isShown && <Word onClick={() => setShown(true)}>Show our answer</Word>}
        {'speechSynthesis' in window && <Word onClick={() => speak(asked.leak.question)}>Say it aloud</Word>}
        {!isLast && <Word onClick={onEnd}>Stop</Word>}
      </div>
    </section>
  );
}

/** A channel that empties; the figure beside it says the same. */
function Clock({ left }: { readonly left: number }) {
  return (
    <div className="mt-5 flex items-center gap-4">
      <div
        aria-hidden="true"
        className="h-3.5 flex-1 overflow-hidden rounded-full border-[1.25px] border-ink-3"
      >
        <div className="h-full bg-water-fill" style={{ width: `${(100 * left) / SECONDS}%` }} />
      </div>
      <p role="timer" className={left === 0 ? 'w-28 text-base text-leak' : 'w-28 text-base text-ink-2'}>
        {left === 0 ? 'time is over' : `${left} s left`}
      </p>
    </div>
  );
}

function useSecondsLeft(): readonly [left: number, restart: () => void] {
  const [from, setFrom] = useState(() => performance.now());
  const [left, setLeft] = useState(SECONDS);
  useEffect(() => {
    const tick = () => setLeft(Math.max(0, SECONDS - Math.floor((performance.now() - from) / 1000)));
    const timer = setInterval(tick, 250);
    return () => clearInterval(timer);
  }, [from]);
  return [
    left,
    () => {
      setFrom(performance.now());
      setLeft(SECONDS);
    },
  ];
}

function speak(text: string): void {
  window.speechSynthesis.cancel();
  window.speechSynthesis.speak(
    new SpeechSynthesisUtterance(text.replaceAll('\u00a0u', ' standard uncertainties')),
  );
}
