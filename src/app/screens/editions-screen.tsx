import { EditionsStation } from '#src/features/editions/routes/editions-station.tsx';
import { useWhere } from '#src/lib/events/use-where.ts';
import { useProblem } from '#src/lib/problem/problem-context.ts';
import { useTitle } from '#src/lib/use-title.ts';

/** Everything that was frozen, and the draft that is frozen next. */
export function Component() {
  const { problem } = useProblem();
  useTitle('Editions', problem.title);
  useWhere('Editions');
  return <EditionsStation />;
}
