/** Waiting, in words; it is said only when it takes a moment. */
export function Loading({ what }: { readonly what: string }) {
  return (
    <p role="status" className="late px-6 py-16 text-center font-report text-report text-ink-3 italic">
      Bringing {what}
    </p>
  );
}
