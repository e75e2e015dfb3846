import { useMemo } from 'react';
import type { Fault } from '../../core/fault.ts';
import type { MotionMeasures } from '../../core/motion/reading.ts';
import { printQuantity, type System, unitOf } from '../../core/units/quantities.ts';
import type { MotionEntry } from '../../document/project.ts';
import { axisFor } from '../sheet/axis.ts';
import { MotionRow } from './MotionRow.tsx';

export interface MotionTableProps {
  readonly motions: readonly MotionEntry[];
  readonly measures: ReadonlyMap<string, MotionMeasures>;
  readonly faults: readonly Fault[];
  readonly system: System;
  /** Name of the one whose details are shown. */
  readonly shown: string | null;
}

/** One row a record: all traces on one time axis and one acceleration axis. */
export function MotionTable({ motions, measures, faults, system, shown }: MotionTableProps) {
  const seconds = useMemo(
    () => axisFor(Math.max(...motions.map(({ count, interval }) => (count - 1) * interval)), 4),
    [motions],
  );
  const reach = useMemo(
    () =>
      Math.max(
        ...motions.map(({ samples, scale }) =>
          typeof scale === 'number' ? Math.abs(scale) * (measures.get(samples)?.peakAcceleration ?? 0) : 0,
        ),
      ),
    [motions, measures],
  );
  return (
    <table className="motion-table">
      <caption className="spoken">Records of the suite</caption>
      <colgroup>
        {COLUMNS.map((width, i) => (
          // biome-ignore lint/suspicious/noArrayIndexKey: the columns never move
          <col key={i} style={{ width }} />
        ))}
      </colgroup>
      <thead>
        <tr className="tier">
          <td colSpan={8}>Records as read</td>
          <td colSpan={4}>Scaled: all on one time axis and one acceleration axis</td>
        </tr>
        <tr>
          <Head words>Used</Head>
          <Head words>
            <span className="spoken">Letter</span>
          </Head>
          <Head words unit="file">
            Record
          </Head>
          <Head unit="s">Interval</Head>
          <Head unit=" ">Samples</Head>
          <Head unit={unitOf('acceleration', system)}>Peak</Head>
          <Head unit={unitOf('velocity', system)}>Velocity</Head>
          <Head unit="s">5–95 %</Head>
          <th scope="col" className="words trace-head">
            Acceleration
            <svg width="100%" height="16" aria-hidden="true">
              {[0, seconds.major, 2 * seconds.major, 3 * seconds.major, 4 * seconds.major]
                .filter((time) => time <= seconds.end + 1e-9)
                .map((time) => (
                  <text key={time} x={`${(100 * time) / seconds.end}%`} y="12" className={time === 0 ? '' : 'middle'}>
                    {printQuantity(time, 'time', system, 0)}
                  </text>
                ))}
            </svg>
          </th>
          <Head unit=" ">Factor</Head>
          <Head unit={unitOf('acceleration', system)}>Peak</Head>
          <Head>
            <span className="spoken">More</span>
          </Head>
        </tr>
      </thead>
      <tbody>
        {motions.map((entry, i) => (
          <MotionRow
            key={entry.name}
            at={i}
            of={motions.length}
            entry={entry}
            measures={measures.get(entry.samples) ?? null}
            seconds={seconds}
            reach={reach}
            faults={faults}
            system={system}
            shown={entry.name === shown}
          />
        ))}
      </tbody>
      <tfoot>
        <tr>
          <td colSpan={8} />
          <td colSpan={4}>
            trace height ± {printQuantity(reach, 'acceleration', system)} {unitOf('acceleration', system)}; grey bar: 5
            to 95 % of the Arias intensity
          </td>
        </tr>
      </tfoot>
    </table>
  );
}

/** Widths [px]; the record and the trace take what is left. */
const COLUMNS = [42, 26, undefined, 56, 60, 48, 56, 52, '24%', 72, 48, 32];

function Head({
  children,
  unit,
  words = false,
}: {
  readonly children: React.ReactNode;
  readonly unit?: string;
  readonly words?: boolean;
}) {
  return (
    <th scope="col" className={words ? 'words' : ''}>
      {children}
      {unit !== undefined && <span className="unit">{unit}</span>}
    </th>
  );
}
