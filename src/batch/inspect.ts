import { measuresOf } from '../core/doors.ts';
import { faultLine } from '../core/fault.ts';
import { answersOf, RECORD_FLAGS, type ReadRecord, recordAt } from './record.ts';
import { faultLines, misused, type Verb } from './verb.ts';

/** What was read of record files, with the measures of each motion integrated from rest without correction, SI. */
export const inspect: Verb = {
  usage: 'RECORD… [--unit g] [--interval 0.01]',
  summary: 'what was read of record files, with their measures',
  flags: RECORD_FLAGS,
  run(line) {
    const { answers, faults } = answersOf(line);
    if (line.words.length === 0) return misused(['inspect: names no RECORD', ...faults]);
    if (faults.length > 0) return misused(faults);
    const found: object[] = [];
    const messages: string[] = [];
    for (const file of line.words) {
      const record = recordAt(file, answers);
      if (record.ok) found.push(summaryOf(file, record.value));
      else messages.push(...faultLines(file, record.faults));
    }
    return { exit: messages.length > 0 ? 1 : 0, output: found, messages };
  },
};

function summaryOf(file: string, { layout, unit, warnings, motion }: ReadRecord): object {
  const measures = measuresOf(motion);
  return {
    file,
    layout,
    name: motion.name,
    interval: motion.interval,
    samples: motion.acceleration.length,
    unit,
    peakAcceleration: measures.peakAcceleration,
    peakVelocity: measures.peakVelocity,
    peakDisplacement: measures.peakDisplacement,
    endVelocity: measures.endVelocity,
    ariasIntensity: measures.ariasIntensity,
    duration5to95: measures.duration5to95,
    warnings: warnings.map(faultLine),
  };
}
