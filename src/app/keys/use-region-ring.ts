import { useEffect } from 'react';

/** F6 goes from the page to the next region (entry bar, margin, sill), Shift F6 back; past the last the browser takes over. */
export function useRegionRing(): void {
  useEffect(() => {
    const onKey = (event: KeyboardEvent) => {
      if (event.key !== 'F6' || event.ctrlKey || event.altKey || event.metaKey) return;
      if (document.querySelector('[role=dialog][data-state=open]')) return;
      const regions = [...document.querySelectorAll<HTMLElement>('[data-region]')];
      // A bar may stand inside the page: the innermost region is where one is.
      const at = regions.findLastIndex((region) => region.contains(document.activeElement));
      const next = regions[event.shiftKey ? (at === -1 ? regions.length : at) - 1 : at + 1];
      if (!next) return;
      event.preventDefault();
      startOf(next).focus();
    };
    window.addEventListener('keydown', onKey);
    return () => window.removeEventListener('keydown', onKey);
  }, []);
}

/** Where one begins in a region: what it marks itself, not what a region inside it marks. */
function startOf(region: HTMLElement): HTMLElement {
  const marked = [...region.querySelectorAll<HTMLElement>('[data-region-start]')];
  return marked.find((start) => start.closest('[data-region]') === region) ?? region;
}
