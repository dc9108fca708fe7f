import { ClaimList } from '#src/features/claims/components/claim-list.tsx';
import { ModelStation } from '#src/features/model/routes/model-station.tsx';
import { useWhere } from '#src/lib/events/use-where.ts';
import { useProblem } from '#src/lib/problem/problem-context.ts';
import { useTitle } from '#src/lib/use-title.ts';

/** The model, its comparison, and the claims that stand on them. */
export function Component() {
  const { problem } = useProblem();
  useTitle('Model', problem.title);
  useWhere('Model');
  return <ModelStation claims={<ClaimList />} />;
}
