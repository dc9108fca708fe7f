import { useCallback, useRef, useState, type PointerEvent } from 'react';

/** Less than this is a press. */
const LEAST_DRAG = 8;

/** Dragging a slip along the channel; let go, it is told the place at which it lies. */
export function useSlipDrag(onDrop: (place: number) => void) {
  const start = useRef<number | null>(null);
  const dragged = useRef(false);
  const [by, setBy] = useState<number | null>(null);

  const onPointerDown = (event: PointerEvent) => {
    if (event.button !== 0) return;
    start.current = event.clientX;
    dragged.current = false;
  };
  const onPointerMove = (event: PointerEvent<HTMLElement>) => {
    if (start.current === null) return;
    const moved = event.clientX - start.current;
    if (!dragged.current && Math.abs(moved) < LEAST_DRAG) return;
    if (!dragged.current) event.currentTarget.setPointerCapture(event.pointerId);
    dragged.current = true;
    setBy(moved);
  };
  const end = (event: PointerEvent<HTMLElement>) => {
    if (start.current !== null && dragged.current) onDrop(placeAt(event.currentTarget, event.clientX));
    start.current = null;
    setBy(null);
  };
  return {
    /** How far it is from its place; null: it lies there. */
    by,
    /** Whether the last press was a drag, so that it opens nothing. */
    wasDragged: useCallback(() => dragged.current, []),
    handlers: { onPointerDown, onPointerMove, onPointerUp: end, onPointerCancel: end },
  };
}

/** How many of the other slips lie to the left of a point. */
function placeAt(slip: HTMLElement, x: number): number {
  const others = [...(slip.parentElement?.children ?? [])].filter((other) => other !== slip);
  return others.filter((other) => {
    const { left, width } = other.getBoundingClientRect();
    return left + width / 2 < x;
  }).length;
}
