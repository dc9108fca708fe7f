import { useEffect, useEffectEvent } from 'react';
import type { EvidenceStep } from '#shared/contracts/evidence-changes.ts';
import { isOwnMutation } from '#src/lib/evidence/own-mutations.ts';
import { sameProblem } from '#src/lib/problem/problem-address.ts';
import { useProblem } from '#src/lib/problem/problem-context.ts';
import { eventStream } from './stream.ts';

/** Hears of every change that somebody else makes to this problem's evidence while it is open. */
export function useStepsOfOthers(listener: (step: EvidenceStep) => void): void {
  const { address } = useProblem();
  const heard = useEffectEvent(listener);
  useEffect(
    () =>
      eventStream().onEvent((event) => {
        if (event.type !== 'evidence' || !sameProblem(event, address)) return;
        if (!isOwnMutation(event.step.mutationId)) heard(event.step);
      }),
    [address],
  );
}
