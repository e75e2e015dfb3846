import { type RefObject, useLayoutEffect, useState } from 'react';
import type { Size } from './template.ts';

/** The size of an element, in whole pixels, kept up to date; null before it stands. */
export function useSize(element: RefObject<HTMLElement | null>): Size | null {
  const [size, setSize] = useState<Size | null>(null);
  useLayoutEffect(() => {
    const { current } = element;
    if (current === null) return;
    const measure = () => {
      const { clientWidth: width, clientHeight: height } = current;
      setSize((before) => (before?.width === width && before.height === height ? before : { width, height }));
    };
    measure();
    const observer = new ResizeObserver(measure);
    observer.observe(current);
    return () => observer.disconnect();
  }, [element]);
  return size;
}
