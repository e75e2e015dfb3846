import type { Motion } from '../core/motion/motion.ts';
import type { RecordAnswers, RecordReading } from '../core/motion/reading.ts';

/** Stand in for the motion room's own functions until they are there. */
export function readRecord(file: string, _bytes: Uint8Array, _answers: RecordAnswers): RecordReading {
  throw new TypeError(`${file}: reading records is not available yet`);
}

export function velocityOf(motion: Pick<Motion, 'acceleration' | 'interval'>): Float64Array {
  const { acceleration, interval } = motion;
  const out = new Float64Array(acceleration.length);
  for (let i = 1; i < out.length; i++) out[i] = out[i - 1] + (interval / 2) * (acceleration[i - 1] + acceleration[i]);
  return out;
}
