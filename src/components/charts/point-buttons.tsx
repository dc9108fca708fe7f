import { useRef, useState, type KeyboardEvent } from 'react';
import type { ChartPoint } from './chart-points.ts';

interface PointButtonsProps {
  readonly points: readonly ChartPoint[];
  /** `by` tells how it was reached: a key press in the button takes the focus into the card. */
  readonly onShow: (point: ChartPoint, button: HTMLElement, by: 'pointer' | 'focus' | 'press') => void;
  readonly onLeave: () => void;
}

const STEPS: Readonly<Record<string, number>> = { ArrowRight: 1, ArrowUp: 1, ArrowLeft: -1, ArrowDown: -1 };

/** The points of a chart as buttons over the drawing: one stop of the Tab key, arrows go from point to point. */
export function PointButtons({ points, onShow, onLeave }: PointButtonsProps) {
  const [current, setCurrent] = useState(0);
  const list = useRef<HTMLUListElement>(null);
  const go = (event: KeyboardEvent, from: number) => {
    const to =
      event.key === 'Home' ? 0 : event.key === 'End' ? points.length - 1 : from + (STEPS[event.key] ?? NaN);
    if (!(to >= 0 && to < points.length)) return;
    event.preventDefault();
    setCurrent(to);
    list.current?.querySelectorAll('button')[to]?.focus();
  };
  return (
    <ul ref={list} aria-label="Points" className="contents">
      {points.map((point, i) => (
        <li key={point.key} className="contents">
          <button
            type="button"
            aria-label={point.spoken}
            aria-haspopup="dialog"
            tabIndex={i === Math.min(current, points.length - 1) ? 0 : -1}
            style={{ left: point.x - 12, top: point.y - 12 }}
            className="absolute size-6 rounded-full"
            onKeyDown={(event) => go(event, i)}
            onFocus={(event) => {
              setCurrent(i);
              if (event.currentTarget.matches(':focus-visible')) onShow(point, event.currentTarget, 'focus');
            }}
            onClick={(event) => onShow(point, event.currentTarget, event.detail === 0 ? 'press' : 'pointer')}
            onPointerEnter={(event) =>
              event.pointerType === 'mouse' && onShow(point, event.currentTarget, 'pointer')
            }
            onPointerLeave={onLeave}
          />
        </li>
      ))}
    </ul>
  );
}
