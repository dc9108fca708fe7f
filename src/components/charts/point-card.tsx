import { useCallback, useEffect, useRef, useState } from 'react';
import { ProvenanceCard } from '#src/components/provenance/provenance-card.tsx';
import type { ChartPoint } from './chart-points.ts';

interface OpenPoint {
  readonly point: ChartPoint;
  readonly button: HTMLElement;
  readonly takesFocus: boolean;
}

/** The pointer may cross from the point to its card without closing it. */
const LEAVE_MS = 250;
/** Passing over a point is not asking for it. */
const HOVER_MS = 220;

/** Which point of a chart has its card open. */
export function usePointCard() {
  const [open, setOpen] = useState<OpenPoint | null>(null);
  const timer = useRef<ReturnType<typeof setTimeout>>(undefined);
  const stay = useCallback(() => clearTimeout(timer.current), []);
  useEffect(() => stay, [stay]);
  const after = useCallback(
    (ms: number, run: () => void) => {
      stay();
      timer.current = setTimeout(run, ms);
    },
    [stay],
  );
  const close = useCallback(() => {
    stay();
    setOpen((was) => {
      if (was && !document.activeElement?.contains(was.button)) was.button.focus({ preventScroll: true });
      return null;
    });
  }, [stay]);
  const leave = useCallback(() => after(LEAVE_MS, () => setOpen(null)), [after]);
  const show = useCallback(
    (point: ChartPoint, button: HTMLElement, by: 'pointer' | 'focus' | 'press') => {
      const next = () => setOpen({ point, button, takesFocus: by === 'press' });
      if (by === 'pointer') after(HOVER_MS, next);
      else {
        stay();
        next();
      }
    },
    [after, stay],
  );
  return { open, show, leave, stay, close };
}

interface PointCardProps {
  readonly card: ReturnType<typeof usePointCard>;
  /** Of the chart's frame. */
  readonly width: number;
}

const CARD_WIDTH = 372;
const GAP = 18;

/** A point's card beside it, inside the chart's frame where it fits, else on the other side. */
export function PointCard({ card, width }: PointCardProps) {
  const { open } = card;
  if (!open) return null;
  const { point } = open;
  const fitsRight = point.x + GAP + CARD_WIDTH <= width + 60;
  return (
    <ProvenanceCard
      reference={point.reference}
      onClose={card.close}
      takesFocus={open.takesFocus}
      notch={fitsRight ? 'left' : 'right'}
      onPointerEnter={card.stay}
      onPointerLeave={card.leave}
      place={{
        top: point.y - 27,
        left: fitsRight ? point.x + GAP : point.x - GAP - CARD_WIDTH,
      }}
    />
  );
}
