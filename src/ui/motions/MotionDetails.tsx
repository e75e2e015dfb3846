import { useMemo, useRef } from 'react';
import { displacementOf, velocityOf } from '../../core/motion/integrals.ts';
import type { MotionMeasures } from '../../core/motion/reading.ts';
import { printQuantity, printTyped, type System, unitOf } from '../../core/units/quantities.ts';
import type { MotionEntry } from '../../document/project.ts';
import { samplesOf } from '../../state/samples.ts';
import { useSize } from '../plots/useSize.ts';
import { OriginList } from './OriginList.tsx';
import { RecordTrace } from './RecordTrace.tsx';

export interface MotionDetailsProps {
  readonly entry: MotionEntry;
  readonly letter: string;
  readonly measures: ReadonlyMap<string, MotionMeasures>;
  readonly system: System;
}

/** The chosen record: acceleration, velocity and displacement as scaled, and where it came from. */
export function MotionDetails({ entry, letter, measures, system }: MotionDetailsProps) {
  const place = useRef<HTMLDivElement>(null);
  const size = useSize(place);
  const width = size?.width ?? 660;
  const factor = typeof entry.scale === 'number' ? entry.scale : 1;
  const { samples, interval } = entry;
  const acceleration = samplesOf(samples) ?? null;
  const velocity = useMemo(
    () => (acceleration === null ? null : velocityOf(acceleration, interval)),
    [acceleration, interval],
  );
  const displacement = useMemo(
    () => (acceleration === null || velocity === null ? null : displacementOf(acceleration, velocity, interval)),
    [acceleration, velocity, interval],
  );
  const facts = measures.get(samples) ?? null;
  const say = (value: number, quantity: 'velocity' | 'displacement' | 'acceleration') =>
    `${printQuantity(value, quantity, system)} ${unitOf(quantity, system)}`;
  return (
    <section aria-label={`Record ${entry.name}`}>
      <header className="motion-details-head">
        <h2>
          {letter}, {entry.name}
        </h2>
        <span className="quiet">
          {entry.used
            ? typeof entry.scale === 'number'
              ? `scaled by ${printTyped(entry.scale, 'ratio', system)}`
              : 'factor not typed'
            : 'left out'}
        </span>
      </header>
      <div ref={place}>
        {acceleration === null || velocity === null || displacement === null ? (
          <p className="quiet">The samples of this record are not in this browser: load the record again.</p>
        ) : (
          <>
            <RecordTrace
              name="Ground acceleration"
              quantity="acceleration"
              values={acceleration}
              interval={interval}
              factor={factor}
              width={width}
              height={96}
              system={system}
              words={facts === null ? '' : `as scaled; as read, ${say(facts.peakAcceleration, 'acceleration')}`}
            />
            <RecordTrace
              name="Velocity"
              quantity="velocity"
              values={velocity}
              interval={interval}
              factor={factor}
              width={width}
              height={80}
              system={system}
              words={`ends at ${say(factor * velocity[velocity.length - 1], 'velocity')}`}
            />
            <RecordTrace
              name="Displacement"
              quantity="displacement"
              values={displacement}
              interval={interval}
              factor={factor}
              width={width}
              height={80}
              system={system}
              words={`ends at ${say(factor * displacement[displacement.length - 1], 'displacement')}`}
              numbers
            />
          </>
        )}
      </div>
      <OriginList entry={entry} facts={facts} system={system} />
    </section>
  );
}
