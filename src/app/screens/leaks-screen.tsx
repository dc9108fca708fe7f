import { LeaksStation } from '#src/features/leaks/routes/leaks-station.tsx';
import { useWhere } from '#src/lib/events/use-where.ts';
import { useProblem } from '#src/lib/problem/problem-context.ts';
import { useTitle } from '#src/lib/use-title.ts';

/** Where an opponent will press. */
export function Component() {
  const { problem } = useProblem();
  useTitle('Leak check', problem.title);
  useWhere('Leak check');
  return <LeaksStation />;
}
