import { digestOfSamples } from '../core/digest.ts';
import type { Fault, Result } from '../core/fault.ts';
import type { Motion } from '../core/motion/motion.ts';
import type { RecordAnswers, RecordReading } from '../core/motion/reading.ts';
import { objectOf } from './raw.ts';
import type { FileMotion } from './schema.ts';

/** How a motion given by a file name is got: what the record reader made of it, or why it cannot be reached. (Handed in: the page never reads files this way, and need not load the reader for it.) */
export type ReadFile = (name: string, answers: RecordAnswers) => Result<RecordReading>;

/** The samples of a motion of a project file, with what is known of where they came from. */
export interface Source extends Pick<Motion, 'acceleration' | 'interval'> {
  readonly digest: string;
  readonly origin?: Motion['origin'];
}

/**
 * What is wrong with where a motion of a file gets its samples from, on whatever stands there: samples or a file and not
 * both, unit and interval where they belong, samples that are finite numbers.
 *
 * @param reachable  whether a file beside the project can be read (by the batch command; a browser cannot)
 */
export function sourceFaults(raw: unknown, where: string, reachable: boolean): Fault[] {
  const motion = objectOf(raw);
  if (motion === null) return [];
  const { acceleration, file, interval, unit } = motion;
  const faults: Fault[] = [];
  const refuse = (code: string, key: string, message: string, mend: string) =>
    faults.push({ code, where: `${where}${key}`, message, mend });
  if (acceleration !== undefined && file !== undefined) {
    refuse('both-samples-and-file', '', 'gives both "acceleration" and "file"', 'Keep one of the two');
  } else if (acceleration === undefined && file === undefined) {
    const mend = 'Add the samples, or the name of a record file';
    refuse('no-samples', '', 'gives neither "acceleration" nor "file"', mend);
  } else if (acceleration !== undefined) {
    if (interval === undefined) refuse('missing', '.interval', 'is missing', 'Add the sampling interval in seconds');
    if (unit !== undefined) {
      refuse('unit-without-file', '.unit', 'goes with "file" only; "acceleration" is in m/s2', 'Take it out');
    }
  } else if (!reachable) {
    const message = `${JSON.stringify(file)} cannot be reached from here: a project opened in the browser holds its samples`;
    refuse('file-in-browser', '.file', message, 'Take the motion out of the file, open it, and add the record itself');
  }
  if (acceleration !== undefined) faults.push(...sampleFaults(acceleration, `${where}.acceleration`));
  return faults;
}

/** One fault for all samples that are none: a broken record would else fill the page. */
function sampleFaults(samples: unknown, where: string): Fault[] {
  if (!Array.isArray(samples)) {
    return [
      { code: 'wrong-kind', where, message: 'is no list of samples', mend: 'Put a list of numbers in m/s2 there' },
    ];
  }
  if (samples.length < 2) {
    const message = `has ${samples.length} ${samples.length === 1 ? 'sample' : 'samples'}, a motion has at least 2`;
    return [{ code: 'wrong-count', where, message, mend: 'Put the samples of the record there' }];
  }
  let [wrong, first] = [0, -1];
  for (let i = 0; i < samples.length; i++) {
    if (Number.isFinite(samples[i])) continue;
    if (first < 0) first = i;
    wrong++;
  }
  if (wrong === 0) return [];
  const others = wrong === 1 ? '' : `, and ${wrong - 1} more after it`;
  const message = `is no finite number${others}`;
  return [{ code: 'not-a-sample', where: `${where}[${first}]`, message, mend: 'Put numbers in m/s2 there' }];
}

/** The samples of a motion whose shape is whole and free of faults: its own, or read from its file. */
export function sourceOf(motion: FileMotion, where: string, readFile: ReadFile | undefined): Result<Source> {
  const { acceleration, interval, file, origin } = motion;
  if (file === undefined || readFile === undefined) {
    const samples = Float64Array.from(acceleration ?? []);
    const source = { acceleration: samples, interval: interval ?? 0, digest: digestOfSamples(samples) };
    return { ok: true, value: origin === undefined ? source : { ...source, origin } };
  }
  const read = recordOf(file, motion, where, readFile);
  if (!read.ok) return read;
  const { value } = read;
  const { acceleration: samples } = value;
  return {
    ok: true,
    value: { acceleration: samples, interval: value.interval, digest: digestOfSamples(samples), origin: value.origin },
  };
}

/** A record beside the project: unit and interval as answers, which the reader refuses where they contradict the file. */
function recordOf(file: string, { unit, interval }: FileMotion, where: string, readFile: ReadFile): Result<Motion> {
  const read = readFile(file, {
    ...(unit === undefined ? {} : { unit }),
    ...(interval === undefined ? {} : { interval }),
  });
  if (!read.ok) return { ok: false, faults: read.faults.map((fault) => ({ ...fault, where: `${where}.file` })) };
  const reading = read.value;
  if (reading.motion) return { ok: true, value: reading.motion };
  const asked = reading.asks.map((what) => ({
    code: `no-${what}`,
    where: `${where}.${what}`,
    message: `${file} does not say its ${what}`,
    mend: `Add "${what}" to the motion`,
  }));
  const found = reading.faults.map(({ code, where: place, message, mend }) => ({
    code,
    where: `${where}.file (${file}, ${place})`,
    message,
    mend,
  }));
  return { ok: false, faults: [...found, ...asked] };
}
