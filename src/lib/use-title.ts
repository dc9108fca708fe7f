import { useEffect } from 'react';

/** The document's title, the nearest thing first: "Trials · Leaning Spout · Holdwater". */
export function useTitle(...parts: readonly string[]): void {
  const title = [...parts, 'Holdwater'].join(' · ');
  useEffect(() => {
    document.title = title;
  }, [title]);
}
