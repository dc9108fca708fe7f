import { useEffect, useRef } from 'react';

interface KatexProps {
  readonly latex: string;
  readonly display?: boolean;
  /** What it says, where the hidden MathML is not enough. */
  readonly label?: string | undefined;
  readonly className?: string | undefined;
}

/** A formula, drawn once its drawing has been loaded; until then its place is empty and as tall as a line. */
export function Katex({ latex, display = false, label, className }: KatexProps) {
  const place = useRef<HTMLSpanElement>(null);
  useEffect(() => {
    let isWanted = true;
    void import('./draw-katex.ts').then(({ drawKatex }) => {
      if (isWanted && place.current) drawKatex(place.current, latex, { display });
    });
    return () => {
      isWanted = false;
    };
  }, [latex, display]);
  const role = label === undefined ? {} : { role: 'img', 'aria-label': label };
  return (
    <span className={className} {...role}>
      <span ref={place} className={display ? 'block min-h-[1.4em]' : 'inline'} />
    </span>
  );
}
