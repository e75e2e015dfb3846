import { useRef } from 'react';
import { axisUnitOf } from '../../../core/units/axisUnit.ts';
import { printQuantity, type System } from '../../../core/units/quantities.ts';
import type { ReadAnswer } from '../../../state/imports.ts';
import { evenAxis, ticksBetween } from '../../plots/ticks.ts';
import { useSize } from '../../plots/useSize.ts';

export interface PreviewProps {
  readonly answer: ReadAnswer;
  readonly system: System;
}

/** Left of the traces: their numbers [px]. */
const LEFT = 40;

/** Acceleration and velocity as read; only the acceleration, as far as it goes, where something stopped the reading. */
export function Preview({ answer, system }: PreviewProps) {
  return answer.preview === null ? null : <Traces {...answer} preview={answer.preview} system={system} />;
}

interface TracesProps extends Omit<ReadAnswer, 'preview'> {
  readonly preview: NonNullable<ReadAnswer['preview']>;
  readonly system: System;
}

function Traces({ preview, measures, reading, system }: TracesProps) {
  const box = useRef<HTMLDivElement>(null);
  const size = useSize(box);
  const width = Math.max(120, (size?.width ?? 440) - LEFT - 4);
  const stops = preview.stopsAt !== null;
  const moving = reading.warnings.some(({ code }) => code === 'velocity-ends');
  return (
    <div ref={box} className="import-preview">
      <Trace
        quantity="acceleration"
        words={stops ? 'as far as it was read' : ''}
        time={preview.time}
        values={preview.acceleration}
        end={preview.end}
        stopsAt={preview.stopsAt}
        endsAt={null}
        {...{ width, system }}
        height={stops ? 78 : 66}
        numbers={stops}
      />
      {!stops && (
        <Trace
          quantity="velocity"
          words="by summing"
          time={preview.time}
          values={preview.velocity}
          end={preview.end}
          stopsAt={null}
          endsAt={moving && measures !== null ? measures.endVelocity : null}
          {...{ width, system }}
          height={60}
          numbers
        />
      )}
    </div>
  );
}

interface TraceProps {
  readonly quantity: 'acceleration' | 'velocity';
  readonly words: string;
  readonly time: Float64Array;
  readonly values: Float64Array;
  /** Length of the record [s]. */
  readonly end: number;
  readonly stopsAt: number | null;
  /** Last value, where it is marked: a velocity that does not end at zero. */
  readonly endsAt: number | null;
  readonly width: number;
  readonly height: number;
  readonly numbers: boolean;
  readonly system: System;
}

function Trace(props: TraceProps) {
  const { quantity, words, time, values, end, stopsAt, endsAt, width, height, numbers, system } = props;
  let peak = 0;
  for (let i = 0; i < values.length; i++) if (Math.abs(values[i]) > Math.abs(values[peak])) peak = i;
  const largest = values.length > 0 ? values[peak] : 0;
  const unit = axisUnitOf(quantity, system, largest);
  const axis = evenAxis(unit.onAxis(Math.abs(largest)));
  const seconds = ticksBetween(0, end, Math.max(2, width / 84));
  const x = (at: number) => (at / end) * width;
  const y = (value: number) => height / 2 - (unit.onAxis(value) / axis.end) * (height / 2);
  const points = Array.from(values, (value, i) => `${x(time[i]).toFixed(1)} ${y(value).toFixed(1)}`);
  const said = `${printQuantity(Math.abs(largest), quantity, system)} ${unit.unit}`;
  const name = quantity === 'acceleration' ? 'Acceleration' : 'Velocity';
  const left = x(time[peak] ?? 0) > width - 72;
  const stopX = stopsAt === null ? width : x(stopsAt);
  return (
    <figure className="import-trace">
      <figcaption className="unit">{[`${name}, ${unit.unit}`, words].filter(Boolean).join(', ')}</figcaption>
      <svg
        width={width}
        height={height + (numbers ? 18 : 0)}
        style={{ marginLeft: LEFT }}
        role="img"
        aria-label={`${name} over ${printQuantity(end, 'time', system)} s, peak ${said}`}
      >
        <path d={seconds.at.map((at) => `M${x(at)} 0V${height}`).join('')} stroke="var(--hair)" />
        {axis.ticks.at.map((tick) => {
          const at = height / 2 - (tick / axis.end) * (height / 2);
          return (
            <g key={tick}>
              {tick === 0 && <path d={`M0 ${at}H${width}`} stroke="var(--rule)" />}
              <text x="-6" y={at + 4} textAnchor="end">
                {unit.printTick(tick, tick === 0 ? 0 : axis.ticks.decimals)}
              </text>
            </g>
          );
        })}
        {points.length > 0 && (
          <path d={`M${points.join('L')}`} fill="none" stroke="var(--ink)" strokeWidth="0.9" strokeLinejoin="round" />
        )}
        {stopsAt === null && values.length > 0 && !(endsAt !== null && left) && (
          <Mark
            x={x(time[peak])}
            y={y(largest)}
            left={left}
            text={said}
            tone="ink"
            textY={Math.min(height - 4, Math.max(10, y(largest) + (largest < 0 ? 2 : 10)))}
          />
        )}
        {endsAt !== null && (
          <Mark
            x={width}
            y={y(endsAt)}
            left
            text={`ends at ${printQuantity(endsAt, quantity, system, 3)}`}
            tone="signal"
            textY={Math.max(10, y(endsAt) - 8)}
          />
        )}
        {stopsAt !== null && (
          <g>
            <rect x={stopX} y="0" width={Math.max(0, width - stopX)} height={height} fill="var(--shade)" />
            <path d={`M${stopX} 0V${height}`} stroke="var(--signal)" strokeWidth="1.5" />
            <text
              x={stopX > width / 2 ? stopX - 6 : stopX + 6}
              y="13"
              textAnchor={stopX > width / 2 ? 'end' : 'start'}
              fill="var(--signal)"
              className="import-bold halo"
            >
              stops at {printQuantity(stopsAt, 'time', system)} s
            </text>
          </g>
        )}
        {numbers &&
          seconds.at.map((at) => (
            <text key={at} x={x(at)} y={height + 14} textAnchor="middle">
              {printQuantity(at, 'time', system, seconds.decimals)}
            </text>
          ))}
      </svg>
    </figure>
  );
}

interface MarkProps {
  readonly x: number;
  readonly y: number;
  readonly textY: number;
  readonly left: boolean;
  readonly text: string;
  readonly tone: 'ink' | 'signal';
}

function Mark({ x, y, textY, left, text, tone }: MarkProps) {
  return (
    <g>
      <circle cx={x} cy={y} r="2.5" fill={`var(--${tone})`} />
      <text
        x={left ? x - 8 : x + 7}
        y={textY}
        textAnchor={left ? 'end' : 'start'}
        style={{ fill: `var(--${tone})` }}
        className={tone === 'signal' ? 'import-bold halo' : 'halo'}
      >
        {text}
      </text>
    </g>
  );
}
