import { memo, useMemo } from 'react';
import { axisUnitOf } from '../../core/units/axisUnit.ts';
import { printQuantity, type Quantity, type System } from '../../core/units/quantities.ts';
import { thinned } from '../plots/thin.ts';
import { evenAxis, ticksBetween } from '../plots/ticks.ts';
import { largestAt } from '../strip/panelContent.ts';

export interface RecordTraceProps {
  readonly name: string;
  readonly quantity: Quantity;
  /** As read, SI. */
  readonly values: Float64Array;
  /** [s] */
  readonly interval: number;
  readonly factor: number;
  readonly width: number;
  readonly height: number;
  readonly system: System;
  /** Under the name. */
  readonly words: string;
  /** Numbers of the time axis below. */
  readonly numbers?: boolean;
}

const AXIS_X = 176;

/** One history of a record over its own time, with its largest value marked. */
export const RecordTrace = memo(function RecordTrace(props: RecordTraceProps) {
  const { name, quantity, values, interval, factor, width, height, system, words, numbers = false } = props;
  const across = Math.max(80, width - AXIS_X);
  const at = useMemo(() => largestAt(values), [values]);
  const peak = factor * values[at];
  const unit = axisUnitOf(quantity, system, peak);
  const { end, ticks } = evenAxis(unit.onAxis(Math.abs(peak)));
  const length = Math.max(interval, (values.length - 1) * interval);
  const seconds = ticksBetween(0, length, Math.max(2, across / 84));
  const x = (time: number) => (time / length) * across;
  const y = (onAxis: number) => height / 2 - (onAxis / end) * (height / 2);
  const line = useMemo(() => {
    const kept = thinned(values, 0, values.length, Math.ceil(across));
    const points = Array.from(kept, (i) => {
      const up = height / 2 - (axisUnitOf(quantity, system, 0).onAxis(factor * values[i]) / end) * (height / 2);
      return `${((i * interval * across) / length).toFixed(1)} ${up.toFixed(1)}`;
    });
    return `M${points.join('L')}`;
  }, [values, interval, factor, quantity, system, across, height, length, end]);
  const said = `${printQuantity(peak, quantity, system)} ${unit.unit} at ${printQuantity(at * interval, 'time', system)} s`;
  const px = x(at * interval);
  const left = px > across - 130;
  return (
    <div className="record-trace" style={{ height: height + (numbers ? 30 : 14) }}>
      <div className="record-trace-label">
        <b>
          {name}, {unit.unit}
        </b>
        <p className="quiet small">{words}</p>
      </div>
      <svg style={{ left: AXIS_X }} width={across} height={height} role="img" aria-label={`${name}: peak ${said}`}>
        <path d={seconds.at.map((time) => `M${x(time)} 0V${height}`).join('')} stroke="var(--hair)" />
        {ticks.at.map((tick) => (
          <g key={tick}>
            <path d={`M0 ${y(tick)}H${across}`} stroke={tick === 0 ? 'var(--rule)' : 'var(--hair)'} />
            <text x="-6" y={y(tick) + 4} className="end">
              {tick === 0 ? '0' : unit.printTick(tick, ticks.decimals)}
            </text>
          </g>
        ))}
        <path d={line} fill="none" stroke="var(--ink)" strokeWidth="1" strokeLinejoin="round" />
        <circle cx={px} cy={y(unit.onAxis(peak))} r="2.5" fill="var(--ink)" />
        <text
          x={left ? px - 8 : px + 8}
          y={Math.min(height - 3, Math.max(10, y(unit.onAxis(peak)) + 4))}
          className={`halo ${left ? 'end' : ''}`}
          style={{ fill: 'var(--ink)' }}
        >
          {said}
        </text>
        {numbers &&
          seconds.at.map((time, i) => (
            <text key={time} x={x(time)} y={height + 16} className="middle">
              {printQuantity(time, 'time', system, seconds.decimals)}
              {i === seconds.at.length - 1 && ' s'}
            </text>
          ))}
      </svg>
    </div>
  );
});
