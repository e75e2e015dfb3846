import { digestOfSamples } from '../core/digest.ts';
import { readRecord } from '../core/doors.ts';
import { velocityOf } from '../core/motion/integrals.ts';
import type { RecordAnswers } from '../core/motion/reading.ts';
import { excerptOf } from './excerpt.ts';
import type { ReadAnswer } from './protocol.ts';
import { thin, thinTimes } from './thin.ts';

/** Reads one record file and makes what the import dialog shows beside it. */
export function readFile(file: string, bytes: Uint8Array, answers: RecordAnswers): ReadAnswer {
  const reading = readRecord(file, bytes, answers);
  const places = [
    ...reading.faults.map((fault) => fault.line ?? 1),
    ...reading.mends.map((mend) => mend.line),
    ...reading.facts.map((fact) => fact.line ?? 1),
    reading.firstLine,
  ];
  const { motion } = reading;
  return {
    reading,
    samples: motion ? digestOfSamples(motion.acceleration) : null,
    ...excerptOf(bytes, places),
    preview: motion
      ? {
          time: thinTimes(motion.acceleration.length, motion.interval),
          acceleration: thin(motion.acceleration),
          velocity: thin(velocityOf(motion.acceleration, motion.interval)),
        }
      : null,
  };
}
