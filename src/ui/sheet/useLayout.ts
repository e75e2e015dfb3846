import { type RefObject, useLayoutEffect, useMemo, useState } from 'react';
import { type InputColumn, inputColumns } from './columns.ts';
import { layoutOf, ROOMY_FROM, type SheetLayout, WIDE_FROM } from './layout.ts';
import type { Shown } from './shown.ts';

/** Heights of the parts above and below the sheet [px]: top bar, line and verdict, heads, ground, footers. */
const WIDE_AROUND = 48 + 44 + 60 + 12 + 62;
const NARROW_AROUND = 48 + 76 + 60 + 12 + 93;
const PANELS = 384;
const LEAST_FREE = 300;

export interface PageSize {
  readonly layout: SheetLayout;
  readonly columns: readonly InputColumn[];
  readonly shown: Shown;
  /** Height the building may take [px]. */
  readonly free: number;
}

/**
 * The layout of the sheet for the page as wide as it is.
 *
 * @param show  the columns shown on a page that is narrow, or roomy; the same function for the same columns
 */
export function useLayout(
  page: RefObject<HTMLElement | null>,
  show: (narrow: boolean, roomy: boolean) => Shown,
): PageSize {
  const [size, setSize] = useState({ width: window.innerWidth, window: window.innerWidth, height: window.innerHeight });
  useLayoutEffect(() => {
    const measure = () => {
      const width = page.current?.clientWidth ?? window.innerWidth;
      setSize((before) =>
        before.width === width && before.window === window.innerWidth && before.height === window.innerHeight
          ? before
          : { width, window: window.innerWidth, height: window.innerHeight },
      );
    };
    measure();
    const observer = new ResizeObserver(measure);
    if (page.current !== null) observer.observe(page.current);
    window.addEventListener('resize', measure);
    return () => {
      observer.disconnect();
      window.removeEventListener('resize', measure);
    };
  }, [page]);
  const shown = useMemo(() => show(size.window < WIDE_FROM, size.window >= ROOMY_FROM), [show, size.window]);
  const { hardening, gravity, damper, answers } = shown;
  const parts = useMemo(() => {
    const columns = inputColumns({ hardening, gravity, damper });
    const layout = layoutOf(size.width, size.window, columns, answers);
    const around = layout.narrow ? NARROW_AROUND : WIDE_AROUND;
    return { columns, layout, free: Math.max(LEAST_FREE, size.height - around - PANELS) };
  }, [size, hardening, gravity, damper, answers]);
  return { ...parts, shown };
}
