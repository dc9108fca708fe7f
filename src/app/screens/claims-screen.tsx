import { ClaimSheet } from '#src/features/claims/routes/claim-sheet.tsx';
import { useWhere } from '#src/lib/events/use-where.ts';
import { useProblem } from '#src/lib/problem/problem-context.ts';
import { useTitle } from '#src/lib/use-title.ts';

export function Component() {
  const { problem } = useProblem();
  useTitle('Claims', problem.title);
  useWhere('Claims');
  return <ClaimSheet />;
}
