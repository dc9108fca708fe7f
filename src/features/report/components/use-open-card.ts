import { useCallback, useEffect, useState, type RefObject } from 'react';
import type { ValueReference } from '#shared/evidence/evidence.ts';

/** The provenance card that is open, and the number it belongs to. */
export interface OpenCard {
  readonly reference: ValueReference;
  readonly unit: string | null;
  /** From the page's top. */
  readonly top: number;
  readonly byKey: boolean;
  readonly element: HTMLElement;
}

const CARD_ABOVE_LINE = 34;

/** Which number of a page has its card open in the margin; closing gives the focus back to the number. */
export function useOpenCard(page: RefObject<HTMLElement | null>) {
  const [card, setCard] = useState<OpenCard | null>(null);
  const openReference = useCallback(
    (reference: ValueReference, element: HTMLElement, byKey: boolean, unit: string | null = null) => {
      const frame = page.current?.getBoundingClientRect();
      if (!frame) return;
      const { top } = element.getBoundingClientRect();
      setCard({ reference, unit, byKey, element, top: Math.max(0, top - frame.top - CARD_ABOVE_LINE) });
    },
    [page],
  );
  useOpenMark(card?.element ?? null);
  const close = () => {
    card?.element.focus({ preventScroll: true });
    setCard(null);
  };
  return { card, openReference, close };
}

/** The number whose card is open stands on a washed ground. */
function useOpenMark(element: HTMLElement | null): void {
  useEffect(() => {
    element?.classList.add('lv-open');
    element?.setAttribute('aria-expanded', 'true');
    return () => {
      element?.classList.remove('lv-open');
      element?.setAttribute('aria-expanded', 'false');
    };
  }, [element]);
}
