import { queryOptions, useMutation, useQueryClient } from '@tanstack/react-query';
import {
  addQuestion,
  changeQuestion,
  changeRoom,
  listQuestions,
  removeQuestion,
  type QuestionAbout,
  type Questions,
} from '#shared/contracts/copy-questions.ts';
import { call } from '#src/lib/api/call.ts';
import { copyKeys } from './keys.ts';

const EVERY_MS = 15_000;

/** The room's questions; others of ours may write at the same time. */
export const questionsQuery = (token: string) =>
  queryOptions({
    queryKey: copyKeys.questions(token),
    queryFn: ({ signal }) => call(listQuestions, { params: { token }, signal, mayBeSignedOut: true }),
    refetchInterval: ({ state }) => (state.error ? false : EVERY_MS),
    retry: false,
  });

/** One change of the room. */
export type QuestionStep =
  | {
      readonly do: 'add';
      readonly text: string;
      readonly about: QuestionAbout | null;
      readonly seconds: number;
    }
  | {
      readonly do: 'change';
      readonly id: string;
      readonly text?: string;
      readonly about?: QuestionAbout | null;
      readonly seconds?: number;
      readonly place?: number;
    }
  | { readonly do: 'remove'; readonly id: string }
  | { readonly do: 'allow'; readonly seconds: number };

/** Changes the room; the answer is the room as it stands then. */
export function useQuestionStep(token: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (step: QuestionStep) => send(token, step),
    onSuccess: (questions) => client.setQueryData(copyKeys.questions(token), questions),
  });
}

function send(token: string, step: QuestionStep): Promise<Questions> {
  const options = { mayBeSignedOut: true } as const;
  switch (step.do) {
    case 'add': {
      const { text, about, seconds } = step;
      return call(addQuestion, { params: { token }, body: { text, about, seconds }, ...options });
    }
    case 'change': {
      const { do: _do, id, ...body } = step;
      return call(changeQuestion, { params: { token, question: id }, body, ...options });
    }
    case 'remove':
      return call(removeQuestion, { params: { token, question: step.id }, ...options });
    case 'allow':
      return call(changeRoom, { params: { token }, body: { seconds: step.seconds }, ...options });
  }
}
