import { type ReactNode, useLayoutEffect, useRef } from 'react';
import './table.css';

/** Around a part that scrolls: an edge fades where it goes on at that side, and words say so while it goes on at the right. */
export function Sideways({ children }: { readonly children: ReactNode }) {
  const frame = useRef<HTMLDivElement>(null);
  useLayoutEffect(() => {
    const { current } = frame;
    const part = current?.firstElementChild;
    if (!current || !part) return;
    const look = () => {
      const { scrollLeft, scrollWidth, clientWidth } = part;
      current.toggleAttribute('data-wide', scrollWidth > clientWidth + 1);
      current.toggleAttribute('data-before', scrollLeft > 1);
      current.toggleAttribute('data-after', scrollLeft + clientWidth < scrollWidth - 1);
    };
    const observer = new ResizeObserver(look);
    observer.observe(part);
    for (const inside of part.children) observer.observe(inside);
    part.addEventListener('scroll', look, { passive: true });
    look();
    return () => {
      observer.disconnect();
      part.removeEventListener('scroll', look);
    };
  }, []);
  return (
    <div ref={frame} className="sideways">
      {children}
      <p className="sideways-words quiet small">The table goes on sideways: scroll, or use the arrow keys in it.</p>
    </div>
  );
}
