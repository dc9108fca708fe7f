import { useEffect, useState, type RefObject } from 'react';
import { keep, recall } from '#src/lib/preferences/preference.ts';

/** A place is read when it has stood in view this long. */
const READ_AFTER_MS = 800;

/** How much of each section has been read, 0 to 1, remembered in this browser under a name. */
export function useReadShares(
  page: RefObject<HTMLElement | null>,
  name: string,
  foot: number,
): readonly number[] {
  const [shares, setShares] = useState<readonly number[]>(() => remembered(name));
  useEffect(() => {
    let timer: ReturnType<typeof setTimeout> | undefined;
    const later = () => {
      clearTimeout(timer);
      timer = setTimeout(
        () => setShares((before) => furthest(before, sharesInView(page.current, foot))),
        READ_AFTER_MS,
      );
    };
    later();
    window.addEventListener('scroll', later, { passive: true });
    window.addEventListener('resize', later);
    return () => {
      clearTimeout(timer);
      window.removeEventListener('scroll', later);
      window.removeEventListener('resize', later);
    };
  }, [page, foot]);
  useEffect(() => keep(name, JSON.stringify(shares)), [name, shares]);
  return shares;
}

function remembered(name: string): readonly number[] {
  const shares: unknown = JSON.parse(recall(name) ?? '[]');
  return Array.isArray(shares) ? shares.map(Number) : [];
}

function furthest(before: readonly number[], now: readonly number[]): readonly number[] {
  const next = now.map((share, index) => Math.max(share, before[index] ?? 0));
  return next.every((share, index) => share === before[index]) ? before : next;
}

function sharesInView(page: HTMLElement | null, foot: number): number[] {
  const end = window.innerHeight - foot;
  return [...(page?.querySelectorAll('.report-section') ?? [])].map((section) => {
    const { top, height, bottom } = section.getBoundingClientRect();
    // A section that was passed by in one leap has not been read.
    if (bottom < 0 || top > end || height === 0) return 0;
    return Math.min(1, Math.max(0, (end - top) / height));
  });
}

/** "half read". */
export function readWords(share: number): string {
  if (share < 0.02) return 'not read';
  if (share < 0.35) return 'begun';
  if (share < 0.7) return 'half read';
  return share < 0.97 ? 'nearly read' : 'read';
}
