import { useQuery } from '@tanstack/react-query';
import type { Editor } from '@tiptap/core';
import type { ReactNode } from 'react';
import { Notice } from '#src/components/notice.tsx';
import { Word } from '#src/components/word.tsx';
import { sentenceOf } from '#src/lib/api/api-error.ts';
import { dayAndMonth, timeOfDay } from '#src/lib/dates/say-date.ts';
import { questionsQuery } from '../api/questions.ts';
import { roomQuery } from '../api/room.ts';
import type { ReportPart } from '../passages/report-parts.ts';
import { KeyForm } from './key-form.tsx';
import { QuestionChannel } from './question-channel.tsx';

export interface QuestionRoomProps {
  readonly token: string;
  readonly recipient: string;
  readonly lender: string;
  readonly editor: Editor | null;
  readonly parts: readonly ReportPart[];
}

/** The foot of a copy: the reader's own questions, behind the key that the first of them sets. */
export function QuestionRoom(props: QuestionRoomProps) {
  const { token, recipient, lender } = props;
  const room = useQuery(roomQuery(token));
  const questions = useQuery({ ...questionsQuery(token), enabled: room.data?.isOpen === true });
  if (room.data?.isOpen && questions.data) return <QuestionChannel {...props} room={questions.data} />;
  const error = room.error ?? questions.error;
  if (error) {
    return (
      <Foot>
        <Notice title={sentenceOf(error)}>
          <Word onClick={() => void room.refetch().then(() => questions.refetch())}>Try again</Word>
        </Notice>
      </Foot>
    );
  }
  if (!room.data || room.data.isOpen) return <Foot>{null}</Foot>;
  const { keySetAt } = room.data;
  return (
    <Foot>
      <div className="flex flex-wrap items-start justify-between gap-x-8 gap-y-2">
        <p className="max-w-[640px] text-sm text-ink-2">
          {keySetAt === null
            ? `Set a key, tell it only to ${recipient}, and write your questions behind it. ${lender} cannot read them by any way. Only a hash of the key is kept, so write it down.`
            : `A key was set here on ${dayAndMonth(new Date(keySetAt))}, ${timeOfDay(new Date(keySetAt))}. If nobody of yours did, write your questions elsewhere, and say so to the team that lent this.`}
        </p>
        <KeyForm token={token} words={keySetAt === null ? 'Set the key' : 'Open our questions'} />
      </div>
    </Foot>
  );
}

function Foot({ children }: { readonly children: ReactNode }) {
  return (
    <div className="ask-inner">
      <h2 className="font-report text-[19px]/[26px] font-medium">Our questions</h2>
      {children}
    </div>
  );
}
