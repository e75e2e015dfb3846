import { useEffect, useRef, useState } from 'react';
import { queueDraw } from './drawQueue.ts';
import { clearPlot, drawPlot, type PlotSpec } from './plotly.ts';

export interface PlotProps {
  /** Makes what is to be drawn, when its turn comes; null: nothing to draw yet. A new function is a new drawing. */
  readonly spec: (() => PlotSpec | null) | null;
  /** What it shows, in a sentence. */
  readonly label: string;
  /** Drawn from numbers that are no longer those of the document. */
  readonly old?: boolean;
}

/** One plot, drawn by the plot library when its turn comes: the answers go first. */
export function Plot({ spec, label, old = false }: PlotProps) {
  const place = useRef<HTMLDivElement>(null);
  const [failed, setFailed] = useState(false);
  useEffect(() => {
    const element = place.current;
    if (element === null || spec === null) return;
    return queueDraw(element, async () => {
      const made = spec();
      if (made === null) return;
      await drawPlot(element, made).then(
        () => setFailed(false),
        () => setFailed(true),
      );
    });
  }, [spec]);
  useEffect(() => {
    const element = place.current;
    return () => {
      if (element !== null) clearPlot(element);
    };
  }, []);
  return (
    <>
      <div ref={place} className={`plot ${old ? 'old' : ''}`} role="img" aria-label={label} />
      {failed && (
        <p className="plot-failed small quiet">The plots could not be loaded: reload the page. The numbers stand.</p>
      )}
    </>
  );
}
