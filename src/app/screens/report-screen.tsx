import { ReportStation } from '#src/features/report/routes/report-station.tsx';
import { useProblem } from '#src/lib/problem/problem-context.ts';
import { useTitle } from '#src/lib/use-title.ts';

export function Component() {
  const { problem } = useProblem();
  useTitle('Report', problem.title);
  return <ReportStation />;
}
