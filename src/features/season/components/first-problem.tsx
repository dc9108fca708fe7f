/** The first row of an empty season. */
export function FirstProblem({ mayWrite }: { readonly mayWrite: boolean }) {
  return (
    <section
      aria-label="Problems"
      className="page-sheet px-[34px] py-6 font-report text-report text-ink-3 italic"
    >
      {mayWrite
        ? '1, the short name of a problem, and its task as it was set'
        : 'No problem is here yet. The captain or a member begins the first.'}
    </section>
  );
}
