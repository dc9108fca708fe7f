import { Button } from '#src/components/button.tsx';
import { useEndSession } from '../api/end-session.ts';

/** Signed in, but in no team. */
export function NoTeam({ name }: { readonly name: string }) {
  const { mutate, isPending } = useEndSession();
  return (
    <main id="page" tabIndex={-1} data-region="page" className="mx-auto max-w-[680px] px-5 pt-24">
      <h1 className="h1">You are in no team yet</h1>
      <p className="mt-4 font-report text-report text-ink-2">
        You are signed in as {name}. Ask your advisor, or a team’s captain, to take you in; then load this
        page again.
      </p>
      <Button className="mt-6" busy={isPending} onClick={() => mutate()}>
        Sign out
      </Button>
    </main>
  );
}
