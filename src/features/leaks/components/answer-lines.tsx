import { useEffect, useRef, useState } from 'react';
import { MAX_LEAK_ANSWER } from '#shared/contracts/leaks.ts';
import type { LeakAnswer } from '#shared/leaks/prepared-leak.ts';
import { Button } from '#src/components/button.tsx';
import { Notice } from '#src/components/notice.tsx';
import { TextArea } from '#src/components/text-area.tsx';
import { Word } from '#src/components/word.tsx';
import { sentenceOf } from '#src/lib/api/api-error.ts';
import { useProblem } from '#src/lib/problem/problem-context.ts';
import { useAnswerLeak } from '../api/answer-leak.ts';

interface AnswerLinesProps {
  readonly leak: string;
  readonly question: string;
  readonly answer: LeakAnswer | null;
  readonly isStale: boolean;
}

/** Our answer on a dash, and the word to write it; or the lines in which it is written. */
export function AnswerLines({ leak, question, answer, isStale }: AnswerLinesProps) {
  const [isWriting, setWriting] = useState(false);
  if (isWriting)
    return <AnswerForm leak={leak} question={question} answer={answer} onDone={() => setWriting(false)} />;
  const word = <AnswerWord question={question} isFirst={!answer} onPress={() => setWriting(true)} />;
  if (!answer) return word;
  return (
    <p className="mt-0.5 font-report text-[16px]/[22px]">
      <span className="text-ink-3">–</span> {answer.text}
      {isStale && (
        <b className="ml-2 font-ui text-sm font-semibold text-leak">
          Look again: the numbers have moved since.
        </b>
      )}{' '}
      {word}
    </p>
  );
}

interface AnswerWordProps {
  readonly question: string;
  readonly isFirst: boolean;
  readonly onPress: () => void;
}

function AnswerWord({ question, isFirst, onPress }: AnswerWordProps) {
  const { mayWrite } = useProblem();
  if (!mayWrite) return null;
  return (
    <Word className="ml-1 font-ui text-sm" onClick={onPress}>
      {isFirst ? 'Answer' : 'Change answer'}
      <span className="sr-only">: {question}</span>
    </Word>
  );
}

function AnswerForm({
  leak,
  question,
  answer,
  onDone,
}: Omit<AnswerLinesProps, 'isStale'> & { readonly onDone: () => void }) {
  const { address } = useProblem();
  const [text, setText] = useState(answer?.text ?? '');
  const field = useRef<HTMLTextAreaElement>(null);
  useEffect(() => field.current?.focus(), []);
  const keep = useAnswerLeak(address, leak);
  const send = (next: string) =>
    keep.mutate({ text: next, after: answer?.at ?? null }, { onSuccess: onDone });
  return (
    <form
      className="mt-2 max-w-[620px]"
      onSubmit={(event) => {
        event.preventDefault();
        send(text.trim());
      }}
    >
      <TextArea
        label={<span className="sr-only">Our answer to: {question}</span>}
        hint="As it is said aloud, in two or three sentences."
        ref={field}
        rows={3}
        maxLength={MAX_LEAK_ANSWER}
        value={text}
        onChange={(event) => setText(event.target.value)}
        onKeyDown={(event) => {
          if (event.key !== 'Escape') return;
          event.preventDefault();
          onDone();
        }}
      />
      {keep.error && (
        <Notice title="The answer was not kept." className="mt-2">
          {sentenceOf(keep.error)}
        </Notice>
      )}
      <div className="mt-2 flex flex-wrap items-center gap-x-4 gap-y-2">
        <Button type="submit" kind="main" disabled={keep.isPending || text.trim() === ''}>
          Keep the answer
        </Button>
        <Word onClick={onDone}>Leave it</Word>
        {answer && <Word onClick={() => send('')}>Take the answer away</Word>}
      </div>
    </form>
  );
}
