import { TrialsStation } from '#src/features/trials/routes/trials-station.tsx';
import { useWhere } from '#src/lib/events/use-where.ts';
import { useProblem } from '#src/lib/problem/problem-context.ts';
import { useTitle } from '#src/lib/use-title.ts';

export function Component() {
  const { problem } = useProblem();
  useTitle('Trials', problem.title);
  useWhere('Trials');
  return <TrialsStation />;
}
