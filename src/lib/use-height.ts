import { useCallback, useState } from 'react';

/** Height of an element, followed while it changes. */
export function useHeight(first: number): readonly [(element: HTMLElement | null) => void, number] {
  const [height, setHeight] = useState(first);
  const ref = useCallback((element: HTMLElement | null) => {
    if (!element) return undefined;
    const measure = () => setHeight(Math.round(element.getBoundingClientRect().height));
    const observer = new ResizeObserver(measure);
    observer.observe(element);
    measure();
    return () => observer.disconnect();
  }, []);
  return [ref, height];
}
