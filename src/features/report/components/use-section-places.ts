import { useEffect, useState, type RefObject } from 'react';

/** Where a section's vessel stands, measured from the page's own top. */
export interface SectionPlace {
  readonly top: number;
  readonly height: number;
  /** Where it is against the view. */
  readonly where: 'above' | 'in view' | 'below';
}

const TOP_LINE = 84;

/** Follows the page's sections as it scrolls; `foot` is the height of what covers the foot of the view. */
export function useSectionPlaces(
  page: RefObject<HTMLElement | null>,
  count: number,
  foot: number,
): readonly SectionPlace[] {
  const [places, setPlaces] = useState<readonly SectionPlace[]>([]);
  useEffect(() => {
    const frame = page.current;
    if (!frame) return undefined;
    let waiting = 0;
    const measure = () => {
      waiting = 0;
      setPlaces(measured(frame, foot));
    };
    const soon = () => {
      if (waiting === 0) waiting = requestAnimationFrame(measure);
    };
    const observer = new ResizeObserver(soon);
    observer.observe(frame);
    window.addEventListener('scroll', soon, { passive: true });
    window.addEventListener('resize', soon);
    soon();
    return () => {
      cancelAnimationFrame(waiting);
      observer.disconnect();
      window.removeEventListener('scroll', soon);
      window.removeEventListener('resize', soon);
    };
  }, [page, count, foot]);
  return places;
}

function measured(frame: HTMLElement, covered: number): SectionPlace[] {
  const origin = frame.getBoundingClientRect().top;
  const foot = window.innerHeight - covered;
  return [...frame.querySelectorAll('.report-section')].map((section) => {
    const { top, bottom } = section.getBoundingClientRect();
    const where = bottom < TOP_LINE + 40 ? 'above' : top > foot - 40 ? 'below' : 'in view';
    const from = Math.max(top + 6, TOP_LINE);
    const to = Math.min(bottom - 4, foot - 12);
    return { where, top: from - origin, height: Math.max(24, to - from) };
  });
}
