import { Holders } from '#src/features/copies/components/holders.tsx';
import { LendButton } from '#src/features/copies/components/lend-button.tsx';
import { EditionsStation } from '#src/features/editions/routes/editions-station.tsx';
import { useWhere } from '#src/lib/events/use-where.ts';
import { useProblem } from '#src/lib/problem/problem-context.ts';
import { useTitle } from '#src/lib/use-title.ts';

/** Everything that was frozen and who holds a copy of it, and the draft that is frozen next. */
export function Component() {
  const { problem, address } = useProblem();
  useTitle('Editions', problem.title);
  useWhere('Editions');
  return (
    <EditionsStation
      holdersOf={({ n }) => <Holders address={address} n={n} />}
      actionsFor={({ n }) => <LendButton n={n} />}
    />
  );
}
