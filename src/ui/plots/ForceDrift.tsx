import { useLayoutEffect, useMemo, useRef } from 'react';
import type { Table } from '../../core/report/table.ts';
import { type AxisUnit, axisUnitOf } from '../../core/units/axisUnit.ts';
import type { System } from '../../core/units/quantities.ts';
import { useDocument } from '../../state/document.ts';
import { letterOf } from '../controls/letters.ts';
import { followTime } from '../strip/followTime.ts';
import { valueAt } from '../strip/panelContent.ts';
import { type Loop, loopOf } from './loop.ts';
import { Plot } from './Plot.tsx';
import type { PlotSpec } from './plotly.ts';
import { KeyLine, plotSize, SquareFrame, type SquareLayout } from './SquareFrame.tsx';
import { axis, baseLayout, LIMIT_DASHES, MARGIN, type Size } from './template.ts';
import { thinnedPath } from './thin.ts';
import { ticksBetween, tickWords } from './ticks.ts';
import type { Tokens } from './tokens.ts';
import type { ShownRun } from './useShownRun.ts';

export interface ForceDriftProps {
  readonly layout: SquareLayout;
  readonly tokens: Tokens;
  readonly system: System;
  readonly old: boolean;
  readonly shown: ShownRun | null;
}

/** The axes of the plot: where a value stands [px from the plot's corner]. */
interface Axes {
  readonly size: Size;
  readonly drift: AxisUnit;
  readonly force: AxisUnit;
  readonly endX: number;
  readonly endY: number;
  readonly x: (drift: number) => number;
  readonly y: (force: number) => number;
}

/** A limit further out than so many times the largest drift is not drawn. */
const FAR = 3;

/** Storey shear against the drift of the chosen storey: what has been by the cursor in ink, what comes in grey. */
export function ForceDrift({ layout, tokens, system, old, shown }: ForceDriftProps) {
  const motions = useDocument((state) => state.project.motions);
  const { width, height } = plotSize(layout);
  const loop = useMemo(() => (shown === null ? null : loopOf(shown)), [shown]);
  const axes = useMemo(
    () => (loop === null ? null : axesOf(loop, { width, height }, system)),
    [loop, width, height, system],
  );
  const spec = useMemo(
    () => (loop === null || axes === null ? null : () => forcePlot(loop, axes, tokens)),
    [loop, axes, tokens],
  );
  const letter = letterOf(
    Math.max(
      0,
      motions.findIndex(({ name }) => name === shown?.motion),
    ),
  );
  const words =
    shown === null || axes === null
      ? 'no run yet'
      : `storey ${shown.storey + 1} under ${letter}; ${axes.force.unit} against ${axes.drift.unit}`;
  return (
    <SquareFrame
      layout={layout}
      kind="force"
      words={words}
      legend={
        <>
          <span>
            <KeyLine stroke="ink" width={1.6} />
            up to the cursor
          </span>
          <span>
            <KeyLine stroke="suite" />
            after it
          </span>
        </>
      }
      table={loop === null || shown === null ? null : () => loopTable(loop, shown)}
    >
      <Plot spec={spec} label={`Force and drift, ${words}`} old={old} />
      {loop !== null && axes !== null && <LoopCursor loop={loop} axes={axes} />}
    </SquareFrame>
  );
}

function axesOf(loop: Loop, size: Size, system: System): Axes {
  const drift = axisUnitOf('drift', system, loop.peakDrift);
  const force = axisUnitOf('force', system, loop.peakForce);
  const limit = loop.limit <= FAR * loop.peakDrift ? loop.limit : 0;
  const endX = 1.12 * (Math.max(drift.onAxis(loop.peakDrift), drift.onAxis(limit)) || 1);
  const endY = 1.12 * (force.onAxis(loop.peakForce) || 1);
  const across = size.width - MARGIN.l - MARGIN.r;
  const up = size.height - MARGIN.t - MARGIN.b;
  return {
    size,
    drift,
    force,
    endX,
    endY,
    x: (value) => MARGIN.l + (0.5 + drift.onAxis(value) / (2 * endX)) * across,
    y: (value) => MARGIN.t + (0.5 - force.onAxis(value) / (2 * endY)) * up,
  };
}

/** Half a pixel on either axis, in SI. */
function reachOf({ x, y }: Axes): { readonly x: number; readonly y: number } {
  return { x: 0.5 / (x(1) - x(0)), y: 0.5 / (y(0) - y(1)) };
}

function forcePlot(loop: Loop, axes: Axes, tokens: Tokens): PlotSpec {
  const { drift, force, endX, endY, size } = axes;
  const kept = thinnedPath(loop.drift, loop.shear, reachOf(axes));
  const along = ticksBetween(-endX, endX, Math.max(6, size.width / 56));
  const upward = ticksBetween(-endY, endY, Math.max(6, size.height / 56));
  const limit = drift.onAxis(loop.limit);
  return {
    still: true,
    data: [
      {
        type: 'scatter',
        mode: 'lines',
        hoverinfo: 'skip',
        x: Float64Array.from(kept, (i) => drift.onAxis(loop.drift[i])),
        y: Float64Array.from(kept, (i) => force.onAxis(loop.shear[i])),
        line: { color: tokens.suite, width: 0.9, simplify: false },
      },
    ],
    layout: {
      ...baseLayout(tokens, size),
      xaxis: axis(tokens, [-endX, endX], along, tickWords(drift, along)),
      yaxis: axis(tokens, [-endY, endY], upward, tickWords(force, upward)),
      shapes:
        limit < endX
          ? [limit, -limit].map((at) => ({
              type: 'line',
              yref: 'paper',
              y0: 0,
              y1: 1,
              x0: at,
              x1: at,
              line: { color: tokens.signal, width: 1, dash: LIMIT_DASHES },
            }))
          : [],
      annotations:
        limit < endX
          ? [
              {
                x: limit,
                xanchor: 'right',
                xshift: -4,
                yref: 'paper',
                y: 0,
                yanchor: 'bottom',
                text: 'limit',
                showarrow: false,
                font: { family: tokens.sans, size: 11, color: tokens.signal },
              },
            ]
          : [],
    },
  };
}

/** The way up to the cursor, and where it stands: written once a frame, over the plot. */
function LoopCursor({ loop, axes }: { readonly loop: Loop; readonly axes: Axes }) {
  const trail = useRef<SVGPathElement>(null);
  const dot = useRef<SVGCircleElement>(null);
  const words = useRef<SVGTextElement>(null);
  const path = useMemo(() => trailOf(loop, axes), [loop, axes]);
  useLayoutEffect(
    () =>
      followTime((time) => {
        const drift = valueAt(loop.drift, loop.interval, time);
        const shear = valueAt(loop.shear, loop.interval, time);
        const x = axes.x(drift);
        const y = axes.y(shear);
        trail.current?.setAttribute('stroke-dasharray', `${path.lengthAt(time).toFixed(1)} 1e6`);
        dot.current?.setAttribute('transform', `translate(${x.toFixed(1)} ${y.toFixed(1)})`);
        const text = words.current;
        if (text === null) return;
        // A storey's line rises to the right: free room is above it at its right end, and below it elsewhere.
        const left = x > axes.size.width - 150;
        const below = Math.min(axes.size.height - MARGIN.b - 4, y + 16);
        text.setAttribute('x', (left ? x - 8 : x + 8).toFixed(1));
        text.setAttribute('y', (left ? Math.max(6, y - 8) : below).toFixed(1));
        text.setAttribute('text-anchor', left ? 'end' : 'start');
        const force = axes.force.decimals === 0 ? 0 : 1;
        text.textContent = `${axes.drift.print(drift, axes.drift.decimals)} ${axes.drift.unit}, ${axes.force.print(shear, force)} ${axes.force.unit}`;
      }),
    [loop, axes, path],
  );
  return (
    <svg className="loop-cursor" width={axes.size.width} height={axes.size.height} aria-hidden="true">
      <path ref={trail} d={path.d} fill="none" stroke="var(--ink)" strokeWidth="1.5" strokeLinejoin="round" />
      <circle ref={dot} r="4.5" fill="var(--accent)" stroke="var(--paper)" strokeWidth="1.5" />
      <text ref={words} className="accent halo" />
    </svg>
  );
}

/** The whole way as one path, and how long it is up to a time [px]. */
function trailOf(loop: Loop, axes: Axes): { readonly d: string; readonly lengthAt: (time: number) => number } {
  const kept = thinnedPath(loop.drift, loop.shear, reachOf(axes));
  const lengths = new Float64Array(kept.length);
  const points: string[] = [];
  let [lastX, lastY] = [0, 0];
  kept.forEach((i, k) => {
    // What is drawn is rounded, so what is measured is too.
    const x = Math.round(10 * axes.x(loop.drift[i])) / 10;
    const y = Math.round(10 * axes.y(loop.shear[i])) / 10;
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

function loopTable(loop: Loop, { motion, storey }: ShownRun): Table {
  return {
    id: 'force-drift',
    title: `Force and drift, storey ${storey + 1}, under ${motion}`,
    columns: [
      {
        key: 'time',
        name: 'Time',
        quantity: 'time',
        decimals: 3,
        values: Array.from(loop.drift, (_, j) => j * loop.interval),
      },
      { key: 'drift', name: 'Drift', quantity: 'drift', decimals: 2, values: Array.from(loop.drift) },
      { key: 'shear', name: 'Storey shear', quantity: 'force', values: Array.from(loop.shear) },
    ],
  };
}
