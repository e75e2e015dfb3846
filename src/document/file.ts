import type { Fault, Result } from '../core/fault.ts';
import { cellFaults } from './cells.ts';
import { crossChecks } from './crossChecks.ts';
import { withDefaults } from './defaults.ts';
import { faultsOf } from './faults.ts';
import { readJson } from './json.ts';
import { migrated } from './migrations.ts';
import { type ReadFile, type Source, sourceFaults, sourceOf } from './motionSource.ts';
import { inFileOrder } from './order.ts';
import { type MotionEntry, PROJECT_FORMAT, PROJECT_VERSION, type Project } from './project.ts';
import { listOf } from './raw.ts';
import { type FileMotion, type FileProject, projectSchema } from './schema.ts';
import { isOnItsWay, refusedAsTyped } from './unfinished.ts';

/** A project with its samples [m/s2] by digest. */
export interface OpenedProject {
  readonly project: Project;
  readonly samples: ReadonlyMap<string, Float64Array>;
}

/**
 * Reads the text of a project file; all its faults at once, and nothing of it is used while there is one.
 *
 * @param readFile  reads a record beside the project; left out where none can be reached: a motion with `file` is a fault
 */
export function readProject(text: string, readFile?: ReadFile): Result<OpenedProject> {
  const read = checked(text, readFile !== undefined);
  if (!read.ok) return read;
  const { file, faults } = read.value;
  if (faults.length === 0) return withSources(file, readFile);
  return { ok: false, faults: inFileOrder([...faults, ...recordFaults(file, faults, readFile)]) };
}

/**
 * Reads the text of a project file as the browser does: like `readProject`, but a document that was saved on its way is opened as
 * it stands, and `caseOf` then lists its open cells. Any other fault refuses the file, with the full list.
 */
export function readProjectOnItsWay(text: string): Result<OpenedProject> {
  const read = checked(text, false);
  if (!read.ok) return read;
  const { file, faults } = read.value;
  return faults.every(isOnItsWay) ? withSources(file, undefined) : { ok: false, faults: inFileOrder(faults) };
}

interface Checked {
  /** Of this shape where there are no faults; where they all say that it is on its way, but for numbers not typed or text. */
  readonly file: FileProject;
  readonly faults: readonly Fault[];
}

function checked(text: string, reachable: boolean): Result<Checked> {
  const json = readJson(text);
  if (!json.ok) return json;
  const current = migrated(json.value);
  if (!current.ok) return current;
  const file = withDefaults(current.value);
  const shape = projectSchema.safeParse(file);
  const faults = [
    ...(shape.success ? [] : faultsOf(shape.error, file)),
    ...crossChecks(file),
    ...listOf(file.motions).flatMap((motion, i) => sourceFaults(motion, `motions[${i}]`, reachable)),
  ];
  return { ok: true, value: { file: file as unknown as FileProject, faults } };
}

function withSources(file: FileProject, readFile: ReadFile | undefined): Result<OpenedProject> {
  const faults: Fault[] = [];
  const entries: MotionEntry[] = [];
  const samples = new Map<string, Float64Array>();
  for (const [i, motion] of file.motions.entries()) {
    const source = sourceOf(motion, `motions[${i}]`, readFile);
    if (!source.ok) faults.push(...source.faults);
    else {
      entries.push(entryOf(motion, source.value));
      samples.set(source.value.digest, source.value.acceleration);
    }
  }
  return faults.length > 0
    ? { ok: false, faults }
    : { ok: true, value: { project: projectOf(file, entries), samples } };
}

/** Faults of the records that a file with faults elsewhere names, so that they come with the others. */
function recordFaults({ motions }: FileProject, faults: readonly Fault[], readFile: ReadFile | undefined): Fault[] {
  return listOf(motions).flatMap((motion, i) => {
    const where = `motions[${i}]`;
    if (faults.some((fault) => fault.where.startsWith(where))) return [];
    const source = sourceOf(motion as FileMotion, where, readFile);
    return source.ok ? [] : source.faults;
  });
}

function entryOf({ name, scale, used, reason }: FileMotion, source: Source): MotionEntry {
  return {
    name,
    interval: source.interval,
    samples: source.digest,
    count: source.acceleration.length,
    scale,
    used,
    ...(reason === undefined ? {} : { reason }),
    ...(source.origin === undefined ? {} : { origin: source.origin }),
  };
}

function projectOf({ title, frame, analysis, limits }: FileProject, motions: readonly MotionEntry[]): Project {
  return { title, frame: frame as Project['frame'], motions, analysis, limits };
}

/**
 * The text of a project file: the same for the same project, numbers in full, samples inlined. A number that its cell refuses is
 * written as the text of that cell, so that a document on its way opens again.
 *
 * @param samplesOf  samples of a motion [m/s2] by digest
 */
export function writeProject(project: Project, samplesOf: (digest: string) => Float64Array): string {
  const { title, frame, motions, analysis, limits } = refusedAsTyped(project, cellFaults(project));
  const entries = motions.map(({ samples, count: _, origin, interval, ...rest }) => ({
    ...rest,
    interval,
    ...(origin ? { origin } : {}),
    acceleration: null,
  }));
  const file = { format: PROJECT_FORMAT, version: PROJECT_VERSION, title, frame, motions: entries, analysis, limits };
  // Samples on one line each motion, the rest indented. A quote inside of a text is escaped, so nothing else looks like this.
  const values = motions.map(({ samples }) => `[${Array.from(samplesOf(samples), decimal).join(',')}]`);
  const text = JSON.stringify(file, null, 2).replace(
    /"acceleration": null/g,
    () => `"acceleration": ${values.shift()}`,
  );
  return `${text}\n`;
}

/** The shortest decimal of a double; a zero keeps its sign, so that the samples keep their digest. */
function decimal(value: number): string {
  return Object.is(value, -0) ? '-0' : String(value);
}
