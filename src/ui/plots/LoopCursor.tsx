import { useLayoutEffect, useMemo, useRef } from 'react';
import { followTime } from '../strip/followTime.ts';
import { endOf, valueAt } from '../strip/panelContent.ts';
import type { Loop } from './loop.ts';
import { type LoopAxes, reachOf } from './loopAxes.ts';
import { MARGIN } from './template.ts';
import { thinnedPath } from './thin.ts';
import { valueWords } from './valueWords.ts';

/** Room that the words at the cursor take [px]. */
const WORDS = 150;

/** The way up to the cursor, where it stands, and where the storey first yielded: written once a frame, over the plot. */
export function LoopCursor({ loop, axes }: { readonly loop: Loop; readonly axes: LoopAxes }) {
  const trail = useRef<SVGPathElement>(null);
  const dot = useRef<SVGCircleElement>(null);
  const words = useRef<SVGTextElement>(null);
  const path = useMemo(() => trailOf(loop, axes), [loop, axes]);
  const end = endOf({ values: loop.drift, interval: loop.interval });
  useLayoutEffect(
    () =>
      followTime((time) => {
        const drift = valueAt(loop.drift, loop.interval, time);
        const value = valueAt(loop.force, loop.interval, time);
        const x = axes.x(drift);
        const y = axes.y(value);
        trail.current?.setAttribute('stroke-dasharray', `${path.lengthAt(time).toFixed(1)} 1e6`);
        dot.current?.setAttribute('transform', `translate(${x.toFixed(1)} ${y.toFixed(1)})`);
        const text = words.current;
        if (text === null) return;
        // A loop rises to the right: free room is above it at its right end, and below it elsewhere.
        const left = x > axes.size.width - WORDS;
        const below = Math.min(axes.size.height - MARGIN.b - 4, y + 16);
        text.setAttribute('x', (left ? x - 8 : x + 8).toFixed(1));
        text.setAttribute('y', (left ? Math.max(6, y - 8) : below).toFixed(1));
        text.setAttribute('text-anchor', left ? 'end' : 'start');
        text.textContent = `${valueWords(axes.drift, drift)}, ${valueWords(axes.force, value)}${time > end + loop.interval ? ', the end' : ''}`;
      }),
    [loop, axes, path, end],
  );
  const { firstYield } = loop;
  return (
    <svg className="loop-cursor" width={axes.size.width} height={axes.size.height} aria-hidden="true">
      <path ref={trail} d={path.d} fill="none" stroke="var(--ink)" strokeWidth="1.5" strokeLinejoin="round" />
      {firstYield !== null && (
        <path
          d={`M${axes.x(firstYield.drift).toFixed(1)} ${(axes.y(firstYield.force) - 6).toFixed(1)}v12`}
          stroke="var(--accent)"
          strokeWidth="1.3"
        />
      )}
      <circle ref={dot} r="4.5" fill="var(--accent)" stroke="var(--paper)" strokeWidth="1.5" />
      <text ref={words} className="accent halo" />
    </svg>
  );
}

/** The whole way as one path, and how long it is up to a time [px]. */
function trailOf(loop: Loop, axes: LoopAxes): { readonly d: string; readonly lengthAt: (time: number) => number } {
  const kept = thinnedPath(loop.drift, loop.force, reachOf(axes));
  const lengths = new Float64Array(kept.length);
  const points: string[] = [];
  let [lastX, lastY] = [0, 0];
  kept.forEach((i, k) => {
    // What is drawn is rounded, so what is measured is too.
    const x = Math.round(10 * axes.x(loop.drift[i])) / 10;
    const y = Math.round(10 * axes.y(loop.force[i])) / 10;
    lengths[k] = k === 0 ? 0 : lengths[k - 1] + Math.hypot(x - lastX, y - lastY);
    [lastX, lastY] = [x, y];
    points.push(`${x} ${y}`);
  });
  const lengthAt = (time: number) => {
    const place = time / loop.interval;
    let [low, high] = [0, kept.length - 1];
    while (low < high) {
      const middle = (low + high + 1) >> 1;
      if (kept[middle] <= place) low = middle;
      else high = middle - 1;
    }
    const next = Math.min(kept.length - 1, low + 1);
    const share = next > low ? Math.min(1, Math.max(0, (place - kept[low]) / (kept[next] - kept[low]))) : 0;
    return lengths[low] + share * (lengths[next] - lengths[low]);
  };
  return { d: points.length > 0 ? `M${points.join('L')}` : '', lengthAt };
}
