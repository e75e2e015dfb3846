import { type RefObject, useEffect } from 'react';
import { sessionStore, setSession, setTime } from '../../state/session.ts';
import type { TimeScale } from './scale.ts';
import { moved, shownRange, zoomed } from './timeRange.ts';

export interface PointerPlace {
  /** From the left end of the time axis and from the top of the stack [px]. */
  readonly x: number;
  readonly y: number;
}

/**
 * The pointer on the time panels: drag moves the cursor, the wheel zooms time about the pointer, a double click shows all
 * of it. `onHover` hears where the pointer is while nothing is dragged; null when it leaves.
 */
export function usePointer(
  element: RefObject<HTMLElement | null>,
  axisX: number,
  scale: TimeScale,
  end: number,
  onHover: (place: PointerPlace | null) => void,
): void {
  useEffect(() => {
    const stack = element.current;
    if (stack === null) return;
    let dragged = false;
    const placeOf = (event: MouseEvent): PointerPlace => {
      const box = stack.getBoundingClientRect();
      return { x: event.clientX - box.left - axisX, y: event.clientY - box.top };
    };
    const onAxis = (event: MouseEvent) => {
      const { x } = placeOf(event);
      return x >= -6 && x <= scale.width + 6;
    };
    const go = (event: MouseEvent) => setTime(Math.min(end, Math.max(0, scale.time(placeOf(event).x))));
    const onDown = (event: PointerEvent) => {
      if (event.button !== 0 || !onAxis(event)) return;
      dragged = true;
      stack.setPointerCapture(event.pointerId);
      stack.querySelector<HTMLElement>('.time-slider')?.focus({ preventScroll: true });
      setSession({ playing: false });
      onHover(null);
      go(event);
      event.preventDefault();
    };
    const onMove = (event: PointerEvent) => {
      if (dragged) go(event);
      else onHover(onAxis(event) ? placeOf(event) : null);
    };
    const onUp = () => {
      dragged = false;
    };
    const onLeave = () => onHover(null);
    const onWheel = (event: WheelEvent) => {
      if (!onAxis(event) || event.ctrlKey) return;
      const { range } = sessionStore.getState();
      const shown = shownRange(range, end);
      const sideways = Math.abs(event.deltaX) > Math.abs(event.deltaY) || event.shiftKey;
      if (sideways) {
        if (range === null) return;
        const by = ((event.deltaX || event.deltaY) / scale.width) * (shown[1] - shown[0]);
        setSession({ range: moved(shown, by, end) });
      } else {
        // All of it is shown and the wheel asks for more: the page may scroll.
        if (range === null && event.deltaY > 0) return;
        const factor = Math.exp(Math.max(-120, Math.min(120, event.deltaY)) / 400);
        setSession({ range: zoomed(shown, scale.time(placeOf(event).x), factor, end) });
      }
      event.preventDefault();
    };
    const onDouble = (event: MouseEvent) => {
      if (onAxis(event)) setSession({ range: null });
    };
    stack.addEventListener('pointerdown', onDown);
    stack.addEventListener('pointermove', onMove);
    stack.addEventListener('pointerup', onUp);
    stack.addEventListener('pointercancel', onUp);
    stack.addEventListener('pointerleave', onLeave);
    stack.addEventListener('wheel', onWheel, { passive: false });
    stack.addEventListener('dblclick', onDouble);
    return () => {
      stack.removeEventListener('pointerdown', onDown);
      stack.removeEventListener('pointermove', onMove);
      stack.removeEventListener('pointerup', onUp);
      stack.removeEventListener('pointercancel', onUp);
      stack.removeEventListener('pointerleave', onLeave);
      stack.removeEventListener('wheel', onWheel);
      stack.removeEventListener('dblclick', onDouble);
    };
  }, [element, axisX, scale, end, onHover]);
}
