import { useRef, type KeyboardEvent, type PointerEvent } from 'react';
import { sayTime } from './say-time.ts';

interface SlipWallProps {
  readonly number: number;
  readonly seconds: number;
  /** Seconds that the whole channel stands for. */
  readonly whole: number;
  /** While it is dragged. */
  readonly onMove: (seconds: number) => void;
  /** Where it came to rest. */
  readonly onSettle: (seconds: number) => void;
}

const STEP = 5;
const BIG_STEP = 30;
const LEAST = 5;
const MOST = 900;

const KEYS: Readonly<Record<string, number>> = {
  ArrowRight: STEP,
  ArrowUp: STEP,
  ArrowLeft: -STEP,
  ArrowDown: -STEP,
  PageUp: BIG_STEP,
  PageDown: -BIG_STEP,
};

/** The right wall of a slip: dragged, or moved by the arrows, it changes the question's time. */
export function SlipWall({ number, seconds, whole, onMove, onSettle }: SlipWallProps) {
  const start = useRef<{ x: number; perPixel: number; last: number } | null>(null);
  const within = (next: number) => Math.min(MOST, Math.max(LEAST, Math.round(next / STEP) * STEP));
  const onPointerDown = (event: PointerEvent<HTMLDivElement>) => {
    event.stopPropagation();
    const channel = event.currentTarget.closest('.ask-channel');
    if (!channel) return;
    event.currentTarget.setPointerCapture(event.pointerId);
    start.current = { x: event.clientX, perPixel: whole / channel.clientWidth, last: seconds };
  };
  const onPointerMove = (event: PointerEvent<HTMLDivElement>) => {
    if (!start.current) return;
    event.stopPropagation();
    const { x, perPixel } = start.current;
    start.current.last = within(seconds + (event.clientX - x) * perPixel);
    onMove(start.current.last);
  };
  const settle = () => {
    if (start.current) onSettle(start.current.last);
    start.current = null;
  };
  const onKeyDown = (event: KeyboardEvent<HTMLDivElement>) => {
    const by = KEYS[event.key];
    if (by === undefined) return;
    event.preventDefault();
    onSettle(within(seconds + by));
  };
  return (
    <div
      role="slider"
      tabIndex={0}
      aria-label={`Time of question ${number}`}
      aria-valuemin={LEAST}
      aria-valuemax={MOST}
      aria-valuenow={seconds}
      aria-valuetext={sayTime(seconds)}
      className="ask-wall"
      onPointerDown={onPointerDown}
      onPointerMove={onPointerMove}
      onPointerUp={settle}
      onPointerCancel={settle}
      onKeyDown={onKeyDown}
    />
  );
}
