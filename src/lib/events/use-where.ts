import { useEffect } from 'react';
import { useProblem } from '#src/lib/problem/problem-context.ts';
import { useStore } from '#src/lib/store/use-store.ts';
import { sameProblem } from '#src/lib/problem/problem-address.ts';
import { here } from './follow-events.ts';
import { eventStream } from './stream.ts';

/** Tells the others where in the problem this person is: "Trials", "Comparison". */
export function useWhere(where: string): void {
  const { address } = useProblem();
  useEffect(() => {
    eventStream().say({ type: 'watch', team: address.team, number: address.number, where });
  }, [address, where]);
}

export interface PersonHere {
  readonly name: string;
  readonly where: string;
}

const NOBODY: readonly PersonHere[] = [];

/** The others who have this problem open. */
export function useHere(): readonly PersonHere[] {
  const { address, me } = useProblem();
  const event = useStore(here);
  if (!event || !sameProblem(event, address)) return NOBODY;
  return event.people.filter(({ name }) => name !== me);
}
