import type { Ref } from 'react';

/**
 * Between the page and what lies on top of it. The library's own would hold the page still with a style element;
 * `data-scrim` does it from our style sheet, without the page jumping sideways on a phone.
 */
export function Scrim({ ref }: { readonly ref?: Ref<HTMLDivElement> }) {
  return (
    <div ref={ref} data-scrim aria-hidden="true" className="fixed inset-0 z-20 bg-ink/25 dark:bg-desk/70" />
  );
}
