import { useLayoutEffect, useRef } from 'react';
import { printQuantity } from '../../core/units/quantities.ts';
import { sessionStore } from '../../state/session.ts';
import { followTime } from './followTime.ts';
import type { TimeScale } from './scale.ts';
import { type TimeKeysContext, timeKey } from './timeKeys.ts';

export interface TimeCursorProps {
  readonly axisX: number;
  readonly scale: TimeScale;
  /** From the top of the stack to the end of the lowest panel [px]. */
  readonly height: number;
  readonly keys: TimeKeysContext;
}

/** How often a playing cursor tells a screen reader its time [ms]. */
const TOLD_EVERY = 500;

/** One line through all time panels. It is a slider for the keyboard; the pointer drags on the panels themselves. */
export function TimeCursor({ axisX, scale, height, keys }: TimeCursorProps) {
  const line = useRef<HTMLDivElement>(null);
  const slider = useRef<HTMLDivElement>(null);
  useLayoutEffect(() => {
    let told = 0;
    return followTime((time) => {
      const x = scale.x(time);
      const hidden = x < -0.5 || x > scale.width + 0.5;
      if (line.current !== null) {
        line.current.style.transform = `translateX(${x.toFixed(2)}px)`;
        line.current.style.visibility = hidden ? 'hidden' : 'visible';
      }
      const now = performance.now();
      if (slider.current === null || (sessionStore.getState().playing && now - told < TOLD_EVERY)) return;
      told = now;
      slider.current.setAttribute('aria-valuenow', time.toFixed(3));
      slider.current.setAttribute('aria-valuetext', `${printQuantity(time, 'time', 'si')} seconds`);
    });
  }, [scale]);
  return (
    <div
      ref={slider}
      className="time-slider"
      style={{ left: axisX, width: scale.width, height }}
      role="slider"
      tabIndex={0}
      aria-label="Time cursor"
      aria-keyshortcuts="Space ArrowLeft ArrowRight Home End P"
      aria-valuemin={0}
      aria-valuemax={keys.end}
      aria-valuenow={0}
      onKeyDown={(event) => {
        if (event.ctrlKey || event.metaKey || event.altKey || !timeKey(event, keys)) return;
        event.preventDefault();
        event.stopPropagation();
      }}
    >
      <div ref={line} className="time-cursor">
        <svg width="12" height={height} aria-hidden="true">
          <path d={`M6 4V${height}`} stroke="var(--accent)" strokeWidth="1.4" />
          <path d="M0 0h12v5l-6 6-6-6z" fill="var(--accent)" />
        </svg>
      </div>
    </div>
  );
}
