import { useRef } from 'react';
import type { Question, QuestionAbout, Questions } from '#shared/contracts/copy-questions.ts';
import type { QuestionStep } from '../api/questions.ts';
import { QuestionSlip } from './question-slip.tsx';
import { sayTime } from './say-time.ts';

interface QuestionSlipsProps {
  readonly room: Questions;
  /** Side by side; otherwise one below the other. */
  readonly isWide: boolean;
  /** Id of the question whose form is open, "new", or null. */
  readonly openId: string | null;
  readonly onStep: (step: QuestionStep) => void;
  readonly onOpen: (question: Question) => void;
  readonly onAbout: (about: QuestionAbout) => void;
  readonly onNew: () => void;
}

/** The channel itself: slips in their order, and what is left of the time. */
export function QuestionSlips({ room, isWide, openId, onStep, onOpen, onAbout, onNew }: QuestionSlipsProps) {
  const channel = useRef<HTMLOListElement>(null);
  const taken = room.questions.reduce((sum, { seconds }) => sum + seconds, 0);
  const left = room.seconds - taken;
  const whole = Math.max(room.seconds, taken);
  return (
    <div className={isWide ? 'ask-channel' : 'ask-list'}>
      <ol ref={channel} className="contents">
        {room.questions.map((question, index) => (
          <QuestionSlip
            key={question.id}
            question={question}
            number={index + 1}
            whole={whole}
            isWide={isWide}
            isOpen={openId === question.id}
            onOpen={() => onOpen(question)}
            onAbout={onAbout}
            onSeconds={(seconds) => onStep({ do: 'change', id: question.id, seconds })}
            onDrop={(place) => place !== index && onStep({ do: 'change', id: question.id, place })}
          />
        ))}
      </ol>
      <div className="ask-left" style={isWide ? { flexGrow: Math.max(left, 0) } : undefined}>
        {openId === 'new' ? (
          <span className="ask-writing">Being written</span>
        ) : (
          <button type="button" className="word" onClick={onNew}>
            Write a question
          </button>
        )}
        <span className={left < 0 ? 'font-semibold text-leak' : ''}>
          {left < 0 ? `${sayTime(-left)} over` : `${sayTime(left)} left`}
        </span>
      </div>
    </div>
  );
}
