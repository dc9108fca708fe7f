import { useMutation, useQueryClient } from '@tanstack/react-query';
import type { z } from 'zod';
import { answerNote, changeNote, writeNote, type NoteChange } from '#shared/contracts/notes.ts';
import { call } from '#src/lib/api/call.ts';
import type { ProblemAddress } from '#src/lib/problem/problem-address.ts';
import { queryKeys } from '#src/lib/query-keys.ts';

export function useWriteNote(address: ProblemAddress) {
  return useMutation({
    mutationFn: (body: z.infer<typeof writeNote.body>) => call(writeNote, { params: { ...address }, body }),
    onSettled: useAskAgain(address),
  });
}

export function useAnswerNote(address: ProblemAddress, note: string) {
  return useMutation({
    mutationFn: (body: z.infer<typeof answerNote.body>) =>
      call(answerNote, { params: { ...address, note }, body }),
    onSettled: useAskAgain(address),
  });
}

/** Settles a note, opens it again, or writes anew where its words stand. */
export function useChangeNote(address: ProblemAddress) {
  return useMutation({
    mutationFn: ({ note, change }: { readonly note: string; readonly change: NoteChange }) =>
      call(changeNote, { params: { ...address, note }, body: change }),
    onSettled: useAskAgain(address),
  });
}

function useAskAgain(address: ProblemAddress) {
  const client = useQueryClient();
  return () => client.invalidateQueries({ queryKey: queryKeys.ofProblem(address, 'notes') });
}
