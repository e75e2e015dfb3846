import { useEffect, useState } from 'react';
import type { MotionMeasures } from '../../core/motion/reading.ts';
import type { MotionEntry } from '../../document/project.ts';
import { samplesOf } from '../../state/samples.ts';
import { whenIdle } from '../plots/whenIdle.ts';
import { knownMeasures, measuresOfSamples } from './measures.ts';

/** Measures by digest of the samples: those not known yet come one by one, when the page has a moment to spare. */
export function useKnownMeasures(motions: readonly MotionEntry[]): ReadonlyMap<string, MotionMeasures> {
  const [measures, setMeasures] = useState(() => known(motions));
  useEffect(() => {
    let withdraw = () => {};
    const next = () => {
      const open = motions.find(({ samples }) => {
        const values = samplesOf(samples);
        return values !== undefined && knownMeasures(values) === undefined;
      });
      if (open === undefined) {
        setMeasures(known(motions));
        return;
      }
      const values = samplesOf(open.samples);
      if (values !== undefined) measuresOfSamples(values, open.interval);
      setMeasures(known(motions));
      withdraw = whenIdle(next, 200);
    };
    next();
    return () => withdraw();
  }, [motions]);
  return measures;
}

function known(motions: readonly MotionEntry[]): ReadonlyMap<string, MotionMeasures> {
  return new Map(
    motions.flatMap(({ samples }) => {
      const values = samplesOf(samples);
      const measures = values && knownMeasures(values);
      return measures ? [[samples, measures] as const] : [];
    }),
  );
}
