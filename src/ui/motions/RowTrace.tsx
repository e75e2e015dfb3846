import { memo, useMemo } from 'react';
import type { MotionMeasures } from '../../core/motion/reading.ts';
import type { MotionEntry } from '../../document/project.ts';
import { samplesOf } from '../../state/samples.ts';
import { thinned } from '../plots/thin.ts';
import { type Axis, linesOf } from '../sheet/axis.ts';

export interface RowTraceProps {
  readonly entry: MotionEntry;
  readonly measures: MotionMeasures | null;
  readonly seconds: Axis;
  /** [m/s2] */
  readonly reach: number;
  readonly shown: boolean;
}

/** Drawn on so many units across, stretched to the cell. */
const WIDTH = 400;
const HEIGHT = 50;

/** A small trace of a record as scaled, beside the others on the same axes. */
export const RowTrace = memo(function RowTrace({ entry, measures, seconds, reach, shown }: RowTraceProps) {
  const { samples, interval, scale } = entry;
  const factor = typeof scale === 'number' ? scale : 0;
  const x = (time: number) => (time / seconds.end) * WIDTH;
  const outline = useMemo(() => {
    const values = samplesOf(samples);
    if (values === undefined || !(reach > 0)) return '';
    const columns = Math.ceil(((values.length * interval) / seconds.end) * WIDTH * 0.5);
    const kept = thinned(values, 0, values.length, Math.max(1, columns));
    const points = Array.from(
      kept,
      (i) =>
        `${((i * interval * WIDTH) / seconds.end).toFixed(1)} ${(HEIGHT / 2 - (factor * values[i] * (HEIGHT / 2 - 4)) / reach).toFixed(1)}`,
    );
    return `M${points.join('L')}`;
  }, [samples, interval, factor, reach, seconds.end]);
  return (
    <svg viewBox={`0 0 ${WIDTH} ${HEIGHT}`} preserveAspectRatio="none" role="img" aria-label={`Trace of ${entry.name}`}>
      <g vectorEffect="non-scaling-stroke" fill="none">
        <path
          d={[0, ...linesOf(seconds, seconds.major)].map((time) => `M${x(time)} 0V${HEIGHT}`).join('')}
          stroke="var(--hair)"
          vectorEffect="non-scaling-stroke"
        />
        <path d={`M0 ${HEIGHT / 2}H${WIDTH}`} stroke="var(--rule)" vectorEffect="non-scaling-stroke" />
        <path
          d={outline}
          stroke={shown ? 'var(--accent)' : entry.used ? 'var(--ink)' : 'var(--suite)'}
          strokeWidth="0.7"
          vectorEffect="non-scaling-stroke"
        />
      </g>
      {measures !== null && (
        <rect
          x={x(measures.start5to95)}
          y={HEIGHT - 3}
          width={x(measures.duration5to95)}
          height="2"
          fill="var(--suite)"
        />
      )}
    </svg>
  );
});
