import type { Ref } from 'react';

/**
 * Between the page and what lies on top of it. Plain, because the library's own holds the page still by putting
 * a style element into it, which the content policy forbids; `data-scrim` does the same from the style sheet.
 */
export function Scrim({ ref }: { readonly ref?: Ref<HTMLDivElement> }) {
  return (
    <div ref={ref} data-scrim aria-hidden="true" className="fixed inset-0 z-20 bg-ink/25 dark:bg-desk/70" />
  );
}
