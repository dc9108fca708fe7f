import { useCallback, useState } from 'react';

/** Width of an element in CSS pixels, kept up to date: `const [ref, width] = useWidth(1240)`. */
export function useWidth(before: number): [(element: Element | null) => (() => void) | undefined, number] {
  const [width, setWidth] = useState(before);
  const ref = useCallback((element: Element | null) => {
    if (!element) return undefined;
    const observer = new ResizeObserver(([entry]) => {
      if (entry) setWidth(Math.round(entry.contentRect.width));
    });
    observer.observe(element);
    return () => observer.disconnect();
  }, []);
  return [ref, width];
}
