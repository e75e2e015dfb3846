import type { ReactNode } from 'react';
import type { MotionMeasures } from '../../core/motion/reading.ts';
import { printQuantity, type System } from '../../core/units/quantities.ts';
import type { MotionEntry } from '../../document/project.ts';

export interface OriginListProps {
  readonly entry: MotionEntry;
  readonly facts: MotionMeasures | null;
  readonly system: System;
}

/** Where a record came from, how it was read, and every change made to what stands in its file. */
export function OriginList({ entry, facts, system }: OriginListProps) {
  const { origin } = entry;
  const asked = (from: 'file' | 'answer' | undefined) =>
    from === 'answer' ? ', answered when it was read' : ', as the file says';
  const rows: readonly (readonly [string, ReactNode])[] = [
    [
      'Samples',
      `${printQuantity(entry.count, 'count', system)} at ${entry.interval} s, ${printQuantity((entry.count - 1) * entry.interval, 'time', system)} s`,
    ],
    ['File', origin?.file ?? 'none kept'],
    ...(origin?.layout === undefined ? [] : [['Layout', origin.layout.replaceAll('-', ' ')] as const]),
    ...(origin?.unit === undefined ? [] : [['Unit', `${origin.unit}${asked(origin.unitFrom)}`] as const]),
    ...(origin?.interval === undefined
      ? []
      : [['Interval', `${origin.interval} s${asked(origin.intervalFrom)}`] as const]),
    ...(origin?.event === undefined ? [] : [['Event', origin.event] as const]),
    ...(origin?.station === undefined ? [] : [['Station', origin.station] as const]),
    ...(origin?.component === undefined ? [] : [['Component', origin.component] as const]),
    ...(facts === null
      ? []
      : [['Arias intensity', `${printQuantity(facts.ariasIntensity, 'velocity', 'si')} m/s as read`] as const]),
    ...(origin?.digest === undefined
      ? []
      : [
          [
            'SHA-256',
            <span key="digest" className="mono digest">
              {origin.digest}
            </span>,
          ] as const,
        ]),
  ];
  const mends = origin?.mends ?? [];
  return (
    <div className="origin">
      <h3>Where it came from</h3>
      <dl>
        {rows.map(([name, value]) => (
          <div key={name}>
            <dt>{name}</dt>
            <dd>{value}</dd>
          </div>
        ))}
      </dl>
      <h3>Mends</h3>
      {mends.length === 0 ? (
        <p className="quiet small">None: every value is as it stands in the file.</p>
      ) : (
        <table className="mend-table">
          <thead>
            <tr>
              <th scope="col">Line</th>
              <th scope="col">Stood there</th>
              <th scope="col">Taken instead</th>
              <th scope="col">Why</th>
            </tr>
          </thead>
          <tbody>
            {mends.map(({ line, was, is, why }) => (
              <tr key={`${line} ${was} ${is}`}>
                <td>{printQuantity(line, 'count', system)}</td>
                <td className="mono">{was}</td>
                <td className="mono">{is}</td>
                <td>{why}</td>
              </tr>
            ))}
          </tbody>
        </table>
      )}
    </div>
  );
}
