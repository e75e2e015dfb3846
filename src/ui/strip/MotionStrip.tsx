import { memo } from 'react';
import type { MotionMeasures } from '../../core/motion/reading.ts';
import { axisUnitOf } from '../../core/units/axisUnit.ts';
import { printQuantity, type System } from '../../core/units/quantities.ts';
import { useMeasures } from '../motions/measures.ts';
import { thinned } from '../plots/thin.ts';
import { evenAxis, tickWords } from '../plots/ticks.ts';
import type { Band } from './geometry.ts';
import type { TimeScale } from './scale.ts';
import type { TimeAxisFacts } from './useTimeAxis.ts';

export interface MotionStripProps {
  readonly axis: TimeAxisFacts;
  readonly band: Band;
  readonly scale: TimeScale;
  readonly system: System;
  /** Samples of a motion that is lit by hovering, as scaled; null: none. */
  readonly lit: { readonly samples: Float64Array; readonly interval: number; readonly factor: number } | null;
  /** Where the run ended early, in words, and when [s]; null where it ran to its end. */
  readonly ended: { readonly time: number; readonly words: string } | null;
  /** That run is no longer the document's: its end is, the motion itself is not. */
  readonly old: boolean;
}

/** The ground motion under the building: our own drawing, so that it is there at once. */
export const MotionStrip = memo(function MotionStrip({ axis, band, scale, system, lit, ended, old }: MotionStripProps) {
  const { samples, entry } = axis;
  const { width, ticks, x, range } = scale;
  const factor = axis.scale ?? 1;
  const facts = useMeasures(samples, entry?.interval ?? 1);
  const unit = axisUnitOf('acceleration', system, 0);
  const even = evenAxis(unit.onAxis(Math.abs(factor) * (facts?.peakAcceleration ?? 0)));
  // The measure is a magnitude: the mark stands where the sample is.
  const peak =
    facts === null || samples === null || entry === null
      ? 0
      : factor * samples[Math.round(facts.peakAccelerationTime / entry.interval)];
  const words = tickWords(unit, even.ticks);
  const middle = band.height / 2;
  const y = (value: number) => middle - (unit.onAxis(value) / even.end) * middle;
  const line = samples === null || entry === null ? '' : tracePath(samples, entry.interval, factor, scale, y);
  const litLine = lit === null ? '' : tracePath(lit.samples, lit.interval, lit.factor, scale, y);
  const inside = (time: number) => time >= range[0] && time <= range[1];
  const free = Math.max(0, x(axis.lastSample));
  return (
    <svg
      className="strip-svg"
      style={{ left: 0, top: band.top }}
      width={width}
      height={band.height}
      role="img"
      aria-label={sentence(axis, facts, system)}
    >
      <path d={ticks.at.map((time) => `M${Math.round(x(time)) + 0.5} 0V${band.height}`).join('')} className="s-hair" />
      {even.ticks.at.map((tick) => {
        const at = middle - (tick / even.end) * middle;
        return (
          <g key={tick}>
            <path d={`M0 ${Math.round(at) + 0.5}H${width}`} className={tick === 0 ? 's-rule' : 's-hair'} />
            {facts !== null && (
              <text x="-6" y={at + 4} className="end">
                {words(tick)}
              </text>
            )}
          </g>
        );
      })}
      <svg width={width} height={band.height} style={{ overflow: 'hidden' }} aria-hidden="true">
        {litLine !== '' && <path d={litLine} className="s-suite" strokeWidth="0.8" strokeLinejoin="round" />}
        <path d={line} className="s-ink" strokeWidth="0.9" strokeLinejoin="round" />
        {facts !== null && <StrongMotion facts={facts} scale={scale} y={band.height - 4} />}
      </svg>
      {facts !== null && <StrongWords facts={facts} scale={scale} y={band.height} />}
      {facts !== null && inside(facts.peakAccelerationTime) && (
        <PeakMark
          x={x(facts.peakAccelerationTime)}
          y={y(peak)}
          width={width}
          height={band.height}
          text={`peak ${printQuantity(peak, 'acceleration', system)} ${unit.unit}`}
        />
      )}
      {entry !== null && free < width - 76 && (
        <text x={free + 6} y="12">
          free vibration
        </text>
      )}
      {ended !== null && inside(ended.time) && (
        <g>
          <path
            d={`M${x(ended.time)} 0V${band.height}`}
            className={old ? 's-rule' : 's-signal'}
            strokeDasharray="2 3"
          />
          <text
            x={x(ended.time) + (x(ended.time) > width / 2 ? -6 : 6)}
            // Above the words of the strong motion.
            y={band.height - 18}
            className={`${old ? '' : 'signal'} halo ${x(ended.time) > width / 2 ? 'end' : ''}`}
          >
            {ended.words}
          </text>
        </g>
      )}
    </svg>
  );
});

function tracePath(
  samples: Float64Array,
  interval: number,
  factor: number,
  { range, width, x }: TimeScale,
  y: (value: number) => number,
): string {
  const from = Math.max(0, Math.floor(range[0] / interval) - 1);
  const to = Math.min(samples.length, Math.ceil(range[1] / interval) + 2);
  const kept = thinned(samples, from, to, Math.ceil(width));
  const points: string[] = [];
  for (const i of kept) points.push(`${x(i * interval).toFixed(1)} ${y(factor * samples[i]).toFixed(1)}`);
  if (points.length === 0) return '';
  const end = y(0).toFixed(1);
  // The motion falls to zero over one more interval and stays there.
  if (to === samples.length) points.push(`${x(samples.length * interval).toFixed(1)} ${end}`, `${width} ${end}`);
  return `M${points.join('L')}`;
}

interface StrongProps {
  readonly facts: MotionMeasures;
  readonly scale: TimeScale;
  /** Base line [px]. */
  readonly y: number;
}

/** The stretch in which 5 to 95 % of the Arias intensity come. */
function StrongMotion({ facts: { start5to95, duration5to95 }, scale: { x }, y }: StrongProps) {
  if (duration5to95 <= 0) return null;
  const from = x(start5to95);
  return <rect x={from} y={y} width={x(start5to95 + duration5to95) - from} height="4" fill="var(--suite)" />;
}

function StrongWords({ facts: { start5to95, duration5to95 }, scale: { x, width }, y }: StrongProps) {
  const end = x(start5to95 + duration5to95);
  if (duration5to95 <= 0 || end < 0 || end > width - 96) return null;
  return (
    <text x={end + 5} y={y} className="halo">
      5 to 95 %: {printQuantity(duration5to95, 'time', 'si', 1)} s
    </text>
  );
}

function PeakMark({
  x,
  y,
  width,
  height,
  text,
}: {
  readonly x: number;
  readonly y: number;
  readonly width: number;
  readonly height: number;
  readonly text: string;
}) {
  const left = x > width - 100;
  return (
    <g>
      <circle cx={x} cy={y} r="2.5" className="f-ink" />
      <text
        x={left ? x - 8 : x + 8}
        y={Math.min(height - 6, Math.max(10, y + 3))}
        className={`halo ${left ? 'end' : ''}`}
        style={{ fill: 'var(--ink)' }}
      >
        {text}
      </text>
    </g>
  );
}

function sentence({ entry, scale, end }: TimeAxisFacts, facts: MotionMeasures | null, system: System): string {
  if (entry === null || facts === null) return 'Ground acceleration: no motion';
  const peak = printQuantity(Math.abs(scale ?? 1) * facts.peakAcceleration, 'acceleration', system);
  return `Ground acceleration of ${entry.name}, ${printQuantity(end, 'time', system)} s: peak ${peak} g at ${printQuantity(facts.peakAccelerationTime, 'time', system)} s`;
}
