import { useQueryClient } from '@tanstack/react-query';
import { useCallback } from 'react';
import type { BodyOf, Endpoint } from '#shared/contracts/endpoint.ts';
import type { EvidenceStep } from '#shared/contracts/evidence-changes.ts';
import { call, type Answer, type CallOptions } from '#src/lib/api/call.ts';
import { useProblem } from '#src/lib/problem/problem-context.ts';
import { takeStep } from './evidence-query.ts';
import { newMutationId } from './own-mutations.ts';

type WithoutMutationId<B> = B extends { mutationId: string } ? Omit<B, 'mutationId'> : B;

/**
 * Gives a function that sends one change of this problem's evidence and shows it at once: the answer carries the
 * step, and the same step arriving later on the event stream is known as our own echo. Throws ApiError.
 */
export function useEvidenceCall() {
  const client = useQueryClient();
  const { address } = useProblem();
  return useCallback(
    async <const E extends Endpoint>(
      endpoint: E,
      options: {
        readonly params?: Readonly<Record<string, string>>;
        readonly body: WithoutMutationId<BodyOf<E>>;
        readonly ifMatch?: number | undefined;
      },
    ): Promise<Answer<E> & EvidenceStep> => {
      const sent = {
        params: { ...address, ...options.params },
        body: { ...(options.body as object), mutationId: newMutationId() },
        ifMatch: options.ifMatch,
      };
      const answer = (await call(endpoint, sent as unknown as CallOptions<E>)) as Answer<E> & EvidenceStep;
      takeStep(client, address, answer);
      return answer;
    },
    [client, address],
  );
}
