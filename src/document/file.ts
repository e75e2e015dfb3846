import { digestOfSamples } from '../core/digest.ts';
import { readRecord } from '../core/doors.ts';
import type { Fault, Result } from '../core/fault.ts';
import type { Motion } from '../core/motion/motion.ts';
import { crossChecks } from './crossChecks.ts';
import { faultsOf } from './faults.ts';
import { migrated } from './migrations.ts';
import { notYet } from './notYet.ts';
import { type MotionEntry, PROJECT_FORMAT, PROJECT_VERSION, type Project } from './project.ts';
import { type FileMotion, type FileProject, projectSchema } from './schema.ts';

/** A project with its samples [m/s2] by digest. */
export interface OpenedProject {
  readonly project: Project;
  readonly samples: ReadonlyMap<string, Float64Array>;
}

/** How a motion given by a file name is got: bytes, or why not. Absent in the browser, where such a motion is refused. */
export type ReadFile = (name: string) => Result<Uint8Array>;

/**
 * Reads the text of a project file; all its faults at once, and nothing of it is used while there is one.
 *
 * @param readFile  reads a record beside the project (batch only); left out: a motion with `file` is a fault
 */
export function readProject(text: string, readFile?: ReadFile): Result<OpenedProject> {
  const json = parsed(text);
  if (!json.ok) return json;
  const current = migrated(json.value);
  if (!current.ok) return current;
  const shape = projectSchema.safeParse(current.value);
  const faults = [...(shape.success ? [] : faultsOf(shape.error, current.value)), ...crossChecks(current.value)];
  if (!shape.success) return { ok: false, faults };
  faults.push(...notYet(shape.data));
  const motions = shape.data.motions.map((motion, i) => motionOf(motion, `motions[${i}]`, readFile));
  for (const motion of motions) if (!motion.ok) faults.push(...motion.faults);
  if (faults.length > 0) return { ok: false, faults };
  const entries: MotionEntry[] = [];
  const samples = new Map<string, Float64Array>();
  for (const motion of motions) {
    if (!motion.ok) continue;
    entries.push(motion.value.entry);
    samples.set(motion.value.entry.samples, motion.value.acceleration);
  }
  return { ok: true, value: { project: projectOf(shape.data, entries), samples } };
}

/** The text of a project file: the same for the same project, numbers in full, samples inlined. */
export function writeProject(project: Project, samplesOf: (digest: string) => Float64Array): string {
  const { title, frame, analysis, limits } = project;
  const motions = project.motions.map(({ samples, count: _, origin, interval, ...rest }) => ({
    ...rest,
    interval,
    ...(origin ? { origin } : {}),
    acceleration: null,
  }));
  const file = { format: PROJECT_FORMAT, version: PROJECT_VERSION, title, frame, motions, analysis, limits };
  // Samples on one line each motion, the rest indented. A quote inside of a text is escaped, so nothing else looks like this.
  const values = project.motions.map(({ samples }) => `[${samplesOf(samples).join(',')}]`);
  const text = JSON.stringify(file, null, 2).replace(
    /"acceleration": null/g,
    () => `"acceleration": ${values.shift()}`,
  );
  return `${text}\n`;
}

function parsed(text: string): Result<unknown> {
  try {
    return { ok: true, value: JSON.parse(text.replace(/^\ufeff/, '')) };
  } catch (error) {
    const fault: Fault = {
      code: 'not-json',
      where: placeIn(text, String((error as Error).message)),
      message: `is no JSON: ${(error as Error).message.replace(/\s+/g, ' ').slice(0, 120)}`,
      mend: 'Choose a project file (.swaybook.json), or mend it there',
    };
    return { ok: false, faults: [fault] };
  }
}

/** Line and column of a JSON error, where the engine tells its position. */
function placeIn(text: string, message: string): string {
  const position = /position (\d+)/.exec(message);
  if (!position) return 'file';
  const before = text.slice(0, Number(position[1])).split('\n');
  return `line ${before.length}, column ${(before.at(-1) ?? '').length + 1}`;
}

function projectOf({ title, frame, analysis, limits }: FileProject, motions: readonly MotionEntry[]): Project {
  return {
    title,
    frame: {
      pDelta: frame.pDelta,
      damping: frame.damping as Project['frame']['damping'],
      storeys: frame.storeys.map(({ name, height, mass, stiffness, gravity }) => ({
        name,
        height,
        mass,
        stiffness,
        law: { kind: 'elastic' },
        ...(gravity === undefined ? {} : { gravity }),
      })),
    },
    motions,
    analysis,
    limits,
  };
}

type Got = Result<{ readonly entry: MotionEntry; readonly acceleration: Float64Array }>;

function motionOf(motion: FileMotion, where: string, readFile: ReadFile | undefined): Got {
  const { acceleration, file, interval, unit, name, scale, used, reason } = motion;
  const faults: Fault[] = [];
  const refuse = (code: string, key: string, message: string, mend: string) =>
    faults.push({ code, where: `${where}${key}`, message, mend });
  if (acceleration && file)
    refuse('both-samples-and-file', '', 'gives both "acceleration" and "file"', 'Keep one of the two');
  if (!acceleration && !file)
    refuse(
      'no-samples',
      '',
      'gives neither "acceleration" nor "file"',
      'Add the samples, or the name of a record file',
    );
  if (acceleration && interval === undefined)
    refuse('missing', '.interval', 'is missing', 'Add the sampling interval in seconds');
  if (acceleration && unit !== undefined)
    refuse('unit-without-file', '.unit', 'goes with "file" only; "acceleration" is in m/s2', 'Take it out');
  if (file && !acceleration && !readFile) {
    refuse(
      'file-in-browser',
      '.file',
      `${file} cannot be reached from here: a project opened in the browser holds its samples`,
      'Add the record itself after opening the project without it',
    );
  }
  if (faults.length > 0) return { ok: false, faults };
  let found: Pick<Motion, 'acceleration' | 'interval'> & { origin?: Motion['origin'] };
  if (acceleration) {
    found = {
      acceleration: Float64Array.from(acceleration),
      interval: interval ?? 0,
      ...(motion.origin ? { origin: motion.origin } : {}),
    };
  } else {
    const read = recordOf(file ?? '', motion, where, readFile as ReadFile);
    if (!read.ok) return read;
    found = read.value;
  }
  const samples = digestOfSamples(found.acceleration);
  const entry: MotionEntry = {
    name,
    interval: found.interval,
    samples,
    count: found.acceleration.length,
    scale,
    used,
    ...(reason === undefined ? {} : { reason }),
    ...(found.origin === undefined ? {} : { origin: found.origin }),
  };
  return { ok: true, value: { entry, acceleration: found.acceleration } };
}

/** A record beside the project: unit and interval as answers, which the reader refuses where they contradict the file. */
function recordOf(file: string, { unit, interval }: FileMotion, where: string, readFile: ReadFile): Result<Motion> {
  const bytes = readFile(file);
  if (!bytes.ok) return { ok: false, faults: bytes.faults.map((fault) => ({ ...fault, where: `${where}.file` })) };
  const reading = readRecord(file.split('/').at(-1) ?? file, bytes.value, {
    ...(unit === undefined ? {} : { unit }),
    ...(interval === undefined ? {} : { interval }),
  });
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
