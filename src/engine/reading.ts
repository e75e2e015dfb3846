import { digestOfSamples } from '../core/digest.ts';
import { measuresOf, readRecord } from '../core/doors.ts';
import { velocityOf } from '../core/motion/integrals.ts';
import { UNIT_SIZE } from '../core/motion/read.ts';
import type { RecordAnswers, RecordReading } from '../core/motion/reading.ts';
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
    measures: motion ? measuresOf(motion) : null,
    preview: previewOf(reading),
  };
}

/** The motion for drawing; while something stops it, the samples before the first that could not be read. */
function previewOf({ motion, values, interval, unit }: RecordReading): ReadAnswer['preview'] {
  if (interval === null || !(interval > 0) || unit === null || values.length < 2) return null;
  const stop = motion ? -1 : values.findIndex(Number.isNaN);
  const size = UNIT_SIZE[unit];
  const acceleration =
    motion?.acceleration ?? values.slice(0, stop < 0 ? undefined : stop).map((value) => value * size);
  return {
    end: (values.length - 1) * interval,
    stopsAt: stop < 0 ? null : stop * interval,
    time: thinTimes(acceleration.length, interval),
    acceleration: thin(acceleration),
    velocity: thin(velocityOf(acceleration, interval)),
  };
}
