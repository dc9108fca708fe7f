import { useState } from 'react';
import type { QuestionAbout, Questions } from '#shared/contracts/copy-questions.ts';
import { Button } from '#src/components/button.tsx';
import { Field } from '#src/components/field.tsx';
import { Notice } from '#src/components/notice.tsx';
import { Select } from '#src/components/select.tsx';
import { TextArea } from '#src/components/text-area.tsx';
import { Word } from '#src/components/word.tsx';
import { sentenceOf } from '#src/lib/api/api-error.ts';
import type { QuestionStep, useQuestionStep } from '../api/questions.ts';
import type { ReportPart } from '../passages/report-parts.ts';
import type { Passage } from '../passages/use-selected-passage.ts';

/** The question that is being written or changed. */
export interface OpenQuestion {
  /** null: it is new. */
  readonly id: string | null;
  readonly about: QuestionAbout | null;
}

interface QuestionFormProps {
  readonly room: Questions;
  readonly open: OpenQuestion;
  readonly parts: readonly ReportPart[];
  /** What is marked in the report now. */
  readonly passage: Passage | null;
  readonly step: ReturnType<typeof useQuestionStep>;
  readonly onClose: () => void;
}

const USUAL_SECONDS = 30;
const NOTHING = '';
const KEPT_PASSAGE = 'kept passage';
const MARKED_PASSAGE = 'marked passage';

/** A question with what it is about and the time it may take. */
export function QuestionForm({ room, open, parts, passage, step, onClose }: QuestionFormProps) {
  const index = room.questions.findIndex(({ id }) => id === open.id);
  const question = room.questions[index];
  const [text, setText] = useState(question?.text ?? '');
  const [seconds, setSeconds] = useState(String(question?.seconds ?? USUAL_SECONDS));
  const [about, setAbout] = useState(() => choiceOf(open.about));
  const [isEmpty, setIsEmpty] = useState(false);
  const take = (next: QuestionStep, isLast = true) =>
    step.mutate(next, { onSuccess: () => (isLast ? onClose() : undefined) });
  const keep = () => {
    setIsEmpty(text.trim() === '');
    if (text.trim() === '') return;
    const facts = {
      text: text.trim(),
      about: aboutOf(about, { open, parts, passage }),
      seconds: clamp(seconds),
    };
    take(open.id === null ? { do: 'add', ...facts } : { do: 'change', id: open.id, ...facts });
  };
  return (
    <form
      noValidate
      aria-label={index < 0 ? 'New question' : `Question ${index + 1}`}
      className="grid gap-3"
      onSubmit={(event) => {
        event.preventDefault();
        keep();
      }}
      onKeyDown={(event) => {
        if (event.key !== 'Escape') return;
        event.preventDefault();
        onClose();
      }}
    >
      <TextArea
        ref={(area) => {
          if (area && area.dataset.seen === undefined) {
            area.dataset.seen = '';
            area.focus();
          }
        }}
        label={index < 0 ? 'New question' : `Question ${index + 1}`}
        rows={2}
        maxLength={400}
        className="font-report text-[17px]/6"
        value={text}
        error={isEmpty && text.trim() === '' ? 'Write the question.' : undefined}
        onChange={(event) => setText(event.target.value)}
      />
      <div className="grid grid-cols-[1fr_110px] gap-3">
        <Select
          label="About"
          value={about}
          onChange={(event) => setAbout(event.target.value)}
          options={[
            { value: NOTHING, words: 'nothing in particular' },
            ...(open.about?.kind === 'passage'
              ? [{ value: KEPT_PASSAGE, words: `“${open.about.quote}”` }]
              : []),
            ...(passage && passage.quote !== (open.about?.kind === 'passage' ? open.about.quote : '')
              ? [{ value: MARKED_PASSAGE, words: `what is marked: “${passage.quote}”` }]
              : []),
            ...parts.map(({ anchor, words }) => ({ value: anchor, words })),
          ]}
        />
        <Field
          label="Time"
          unit="s"
          inputMode="numeric"
          value={seconds}
          onChange={(event) => setSeconds(event.target.value)}
        />
      </div>
      {step.error && <Notice title={sentenceOf(step.error)} />}
      <div className="flex flex-wrap items-center gap-x-4 gap-y-2 text-sm">
        {question && index > 0 && (
          <Word onClick={() => take({ do: 'change', id: question.id, place: index - 1 }, false)}>
            Earlier
          </Word>
        )}
        {question && index < room.questions.length - 1 && (
          <Word onClick={() => take({ do: 'change', id: question.id, place: index + 1 }, false)}>Later</Word>
        )}
        {question && <Word onClick={() => take({ do: 'remove', id: question.id })}>Remove</Word>}
        <span className="ml-auto flex gap-2">
          <Button kind="plain" onClick={onClose}>
            Leave it
          </Button>
          <Button kind="main" type="submit" busy={step.isPending}>
            Keep question
          </Button>
        </span>
      </div>
    </form>
  );
}

function choiceOf(about: QuestionAbout | null): string {
  if (about === null) return NOTHING;
  return about.kind === 'passage' ? KEPT_PASSAGE : about.anchor;
}

function aboutOf(
  choice: string,
  { open, parts, passage }: Pick<QuestionFormProps, 'open' | 'parts' | 'passage'>,
): QuestionAbout | null {
  if (choice === KEPT_PASSAGE) return open.about;
  if (choice === MARKED_PASSAGE) return passage;
  const part = parts.find(({ anchor }) => anchor === choice);
  return part ? { kind: 'part', ...part } : null;
}

function clamp(seconds: string): number {
  const typed = Math.round(Number(seconds));
  return Number.isFinite(typed) ? Math.min(900, Math.max(5, typed)) : USUAL_SECONDS;
}
