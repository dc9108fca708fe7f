import type { Editor } from '@tiptap/core';
import { useEffect, useMemo, useState } from 'react';
import type { Questions } from '#shared/contracts/copy-questions.ts';
import { Notice } from '#src/components/notice.tsx';
import { Sheet } from '#src/components/sheet.tsx';
import { Word } from '#src/components/word.tsx';
import { sentenceOf } from '#src/lib/api/api-error.ts';
import { countOf } from '#src/lib/say/count-of.ts';
import { useMedia } from '#src/lib/use-media.ts';
import { useQuestionStep } from '../api/questions.ts';
import { showPassages } from '../passages/asked-passages.ts';
import { goToAbout } from '../passages/go-to-about.ts';
import { useSelectedPassage } from '../passages/use-selected-passage.ts';
import { AllowedTime } from './allowed-time.tsx';
import { QuestionForm, type OpenQuestion } from './question-form.tsx';
import { QuestionSlips } from './question-slips.tsx';
import type { QuestionRoomProps } from './question-room.tsx';

interface QuestionChannelProps extends QuestionRoomProps {
  readonly room: Questions;
}

/** The width from which the slips lie side by side. */
const WIDE = '(min-width: 900px)';

/** The reader's questions as slips in a channel, each as wide as its share of the time allowed. */
export function QuestionChannel({ token, recipient, editor, parts, room }: QuestionChannelProps) {
  const [open, setOpen] = useState<OpenQuestion | null>(null);
  const [isSheet, setIsSheet] = useState(false);
  const isWide = useMedia(WIDE);
  const passage = useSelectedPassage(editor);
  const step = useQuestionStep(token);
  useShownPassages(editor, room, open);
  const begin = (about: OpenQuestion['about']) => setOpen({ id: null, about });
  const form = open && (
    <QuestionForm
      key={open.id ?? 'new'}
      room={room}
      open={open}
      parts={parts}
      passage={passage}
      step={step}
      onClose={() => setOpen(null)}
    />
  );
  const slips = (
    <QuestionSlips
      room={room}
      isWide={isWide}
      openId={open ? (open.id ?? 'new') : null}
      onStep={(next) => step.mutate(next)}
      onOpen={(question) => setOpen({ id: question.id, about: question.about })}
      onAbout={(about) => {
        setIsSheet(false);
        goToAbout(editor, about);
      }}
      onNew={() => begin(null)}
    />
  );
  const head = (
    <>
      {passage && !open && (
        <Word className="min-h-6 min-w-0 truncate" onClick={() => begin(passage)}>
          Ask about “{passage.quote}”
        </Word>
      )}
    </>
  );
  return (
    <div className="ask-inner">
      {isWide && form && <div className="ask-form rises">{form}</div>}
      <div className="mb-1 flex flex-wrap items-baseline gap-x-3 text-sm text-ink-2">
        <h2 className="font-report text-[19px]/[26px] font-medium text-ink">Our questions</h2>
        <span className="max-md:hidden">Only {recipient} sees these.</span>
        {head}
        <span className="ml-auto flex items-baseline gap-3">
          <AllowedTime room={room} onChange={(seconds) => step.mutate({ do: 'allow', seconds })} />
          {!isWide && (
            <Word className="min-h-6" onClick={() => setIsSheet(true)}>
              {room.questions.length === 0 ? 'Write one' : countOf(room.questions.length, 'question')}
            </Word>
          )}
        </span>
      </div>
      {step.error && !open && <Notice title={sentenceOf(step.error)} className="mb-2" />}
      {isWide && slips}
      {!isWide && (
        <Sheet
          open={isSheet || open !== null}
          onClose={() => {
            setIsSheet(false);
            setOpen(null);
          }}
          title="Our questions"
        >
          {form ?? slips}
        </Sheet>
      )}
    </div>
  );
}

function useShownPassages(editor: Editor | null, room: Questions, open: OpenQuestion | null): void {
  const passages = useMemo(() => {
    const asked = room.questions.flatMap(({ id, about }, index) =>
      about?.kind === 'passage' && id !== open?.id
        ? [{ from: about.from, to: about.to, number: index + 1, isOpen: false }]
        : [],
    );
    if (open?.about?.kind !== 'passage') return asked;
    const index = room.questions.findIndex(({ id }) => id === open.id);
    const { from, to } = open.about;
    const number = index < 0 ? room.questions.length + 1 : index + 1;
    return [...asked, { from, to, number, isOpen: true }];
  }, [room, open]);
  useEffect(() => {
    if (editor) showPassages(editor, passages);
  }, [editor, passages]);
}
