import { useEffect, useRef, useState } from 'react';
import { queueDraw } from './drawQueue.ts';
import { clearPlot, drawPlot, type PlotSpec } from './plotly.ts';

export interface PlotProps {
  /** Makes what is to be drawn, when its turn comes; null: nothing, and what was drawn goes. A new function is a new drawing. */
  readonly spec: (() => PlotSpec | null) | null;
  /** What it shows, in a sentence. */
  readonly label: string;
  /** Drawn from numbers that are no longer those of the document. */
  readonly old?: boolean;
  /** Of what: while the drawing is still that of something else it is not shown. */
  readonly of?: string;
  /** Called when what `spec` makes is drawn. */
  readonly onDrawn?: () => void;
}

/** One plot, drawn by the plot library when its turn comes: the answers go first. */
export function Plot({ spec, label, old = false, of = '', onDrawn }: PlotProps) {
  const place = useRef<HTMLDivElement>(null);
  const [failed, setFailed] = useState(false);
  const [drawn, setDrawn] = useState(of);
  useEffect(() => {
    const element = place.current;
    if (element === null) return;
    const clear = () => {
      clearPlot(element);
      setDrawn(of);
    };
    if (spec === null) {
      clear();
      return;
    }
    let wanted = true;
    const withdraw = queueDraw(element, async () => {
      if (!wanted) return;
      const made = spec();
      if (made === null) {
        clear();
        return;
      }
      await drawPlot(element, made).then(
        () => {
          setFailed(false);
          setDrawn(of);
          onDrawn?.();
        },
        () => setFailed(true),
      );
    });
    return () => {
      // Its turn may have come already: it is out of the queue, and not drawn yet.
      wanted = false;
      withdraw();
    };
  }, [spec, of, onDrawn]);
  useEffect(() => {
    const element = place.current;
    return () => {
      if (element !== null) clearPlot(element);
    };
  }, []);
  return (
    <>
      <div
        className={`plot ${old ? 'old' : ''}`}
        role="img"
        aria-label={label}
        style={{ visibility: drawn === of ? undefined : 'hidden' }}
      >
        {/* The library keeps classes of its own on its element: nothing else may write there. */}
        <div ref={place} />
      </div>
      {failed && (
        <p className="plot-failed small quiet">The plots could not be loaded: reload the page. The numbers stand.</p>
      )}
    </>
  );
}
