import { useProblem } from '#src/lib/problem/problem-context.ts';
import { PlainPage } from './plain-page.tsx';

export function Component() {
  const { problem } = useProblem();
  return (
    <PlainPage title={problem.title}>
      <p>{problem.statement}</p>
    </PlainPage>
  );
}
