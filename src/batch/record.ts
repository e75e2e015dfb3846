import { basename } from 'node:path';
import { readRecord } from '../core/doors.ts';
import type { Result } from '../core/fault.ts';
import { ACCELERATION_UNITS, type AccelerationUnit, type Motion } from '../core/motion/motion.ts';
import type { RecordAnswers, RecordReading } from '../core/motion/reading.ts';
import { type CommandLine, readNumber } from './commandLine.ts';
import { readBytes } from './files.ts';

/** A reading with nothing open. */
export type ReadRecord = RecordReading & {
  readonly motion: Motion;
  readonly interval: number;
  readonly unit: AccelerationUnit;
};

/** Flags of the verbs that read a record file. */
export const RECORD_FLAGS = { unit: 'value', interval: 'value' } as const;

/** What `--unit` and `--interval` answer, and what is wrong with them. */
export function answersOf({ flags }: CommandLine): {
  readonly answers: RecordAnswers;
  readonly faults: readonly string[];
} {
  const faults: string[] = [];
  const unitText = flags.get('unit');
  const unit = ACCELERATION_UNITS.find((known) => known === unitText);
  if (unitText !== undefined && unit === undefined) {
    faults.push(`--unit: ${unitText} is none of ${ACCELERATION_UNITS.join(', ')}`);
  }
  const intervalText = flags.get('interval');
  const interval = intervalText === undefined ? undefined : readNumber(intervalText);
  if (interval !== undefined && !(interval !== null && interval > 0)) {
    faults.push(`--interval: ${intervalText} is no number of seconds above 0`);
  }
  return {
    answers: { ...(unit ? { unit } : {}), ...(interval ? { interval } : {}) },
    faults,
  };
}

/** Reads one record file; what the file leaves open and was not answered is a fault that names the flag. */
export function recordAt(path: string, answers: RecordAnswers): Result<ReadRecord> {
  const bytes = readBytes(path);
  if (!bytes.ok) return bytes;
  const reading = readRecord(basename(path), bytes.value, answers);
  const { motion, interval, unit } = reading;
  if (motion !== null && interval !== null && unit !== null) {
    return { ok: true, value: { ...reading, motion, interval, unit } };
  }
  const asked = reading.asks.map((what) => ({
    code: `no-${what}`,
    where: what,
    message: `the file does not say its ${what}`,
    mend: what === 'unit' ? `Say it: --unit ${ACCELERATION_UNITS.join(', ')}` : 'Say it: --interval SECONDS',
  }));
  return { ok: false, faults: [...reading.faults, ...asked] };
}
