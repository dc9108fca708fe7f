import { useProblem } from '#src/lib/problem/problem-context.ts';
import { useWhere } from '#src/lib/events/use-where.ts';
import { useTitle } from '#src/lib/use-title.ts';
import { ProblemSettingsForm } from '../components/problem-settings-form.tsx';

/** The task, its owners, and how its numbers are judged, rounded and printed. */
export function Component() {
  const { problem, mayWrite } = useProblem();
  useTitle('Settings', problem.title);
  useWhere('Settings');
  return (
    <main id="page" tabIndex={-1} data-region="page" className="page-top mx-auto max-w-[760px] px-4.5 pb-24">
      <h1 className="h1">Settings of {problem.title}</h1>
      {!mayWrite && (
        <p className="mt-3 font-report text-report text-ink-2">
          You advise this team, so you read these; the captain and the members change them.
        </p>
      )}
      <ProblemSettingsForm />
    </main>
  );
}
