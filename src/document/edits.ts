import { uniqueName } from './names.ts';
import { MAX_STOREYS, type MotionEntry, type Project, type StoreyRow } from './project.ts';

/**
 * Edits of a project as pure functions: a new project that shares what did not change. References to modes are left as
 * typed; one that is out of range afterwards is named by `caseOf`.
 */
export { clearDamper, setDamper, setLaw, setRole } from './storeyParts.ts';

const BLANK: StoreyRow = { name: '', height: null, mass: null, stiffness: null, law: { kind: 'elastic' } };

/** The lowest place that a storey can take: 0 on the ground, 1 where an isolator stands there. */
export function lowestPlace({ frame }: Project): number {
  return frame.storeys[0]?.role === 'isolator' ? 1 : 0;
}

/**
 * Puts a storey in at an index (0: on the ground, above an isolator where there is one; count: under the roof).
 * @param copyOf  index of the storey that it starts as a copy of (an isolator is copied as a storey); left out: blank
 * @throws RangeError beyond MAX_STOREYS (the screen asks before)
 */
export function addStorey(project: Project, at: number, copyOf?: number): Project {
  const { storeys } = project.frame;
  if (storeys.length >= MAX_STOREYS)
    throw new RangeError(`addStorey: ${storeys.length} storeys, expected fewer than ${MAX_STOREYS}`);
  const made = plain(copyOf === undefined ? BLANK : (storeys[copyOf] ?? BLANK));
  const place = Math.max(at, lowestPlace(project));
  return withStoreys(project, [...storeys.slice(0, place), made, ...storeys.slice(place)]);
}

export function removeStorey(project: Project, at: number): Project {
  return withStoreys(
    project,
    project.frame.storeys.filter((_, i) => i !== at),
  );
}

/** Moves a storey; an isolator stays on the ground, and what would go under it stays above. */
export function moveStorey(project: Project, from: number, to: number): Project {
  const storeys = [...project.frame.storeys];
  const [moved] = storeys.splice(from, 1);
  if (moved === undefined) throw new RangeError(`moveStorey: storey ${from}, there are ${storeys.length}`);
  const lowest = lowestPlace(project);
  if (from < lowest || to < lowest) return project;
  storeys.splice(to, 0, moved);
  return withStoreys(project, storeys);
}

/** A frame of so many equal storeys; weights and stiffness of the first storey there is (no isolator) are kept, else left to type. */
export function makeEqualStoreys(project: Project, count: number, height: number): Project {
  if (!(Number.isInteger(count) && count >= 1 && count <= MAX_STOREYS))
    throw new RangeError(`makeEqualStoreys: ${count}, expected 1 to ${MAX_STOREYS}`);
  const { storeys } = project.frame;
  const like = plain(storeys.find(({ role }) => role !== 'isolator') ?? storeys[0] ?? BLANK);
  return withStoreys(
    project,
    Array.from({ length: count }, () => ({ ...like, height })),
  );
}

/** Makes the frame so many storeys tall: new ones on top are copies of the roof storey (blank where there is none). */
export function growTo(project: Project, count: number): Project {
  let grown = project;
  while (grown.frame.storeys.length < count) {
    const { length } = grown.frame.storeys;
    grown = addStorey(grown, length, length > 0 ? length - 1 : undefined);
  }
  return grown;
}

/** Adds motions under names that are not taken yet. */
export function addMotions(project: Project, motions: readonly MotionEntry[]): Project {
  const added: MotionEntry[] = [...project.motions];
  for (const motion of motions) {
    added.push({ ...motion, name: uniqueName(motion.name, new Set(added.map(({ name }) => name))) });
  }
  return { ...project, motions: added };
}

export function removeMotion(project: Project, at: number): Project {
  return { ...project, motions: project.motions.filter((_, i) => i !== at) };
}

export function moveMotion(project: Project, from: number, to: number): Project {
  const motions = [...project.motions];
  const [moved] = motions.splice(from, 1);
  if (moved === undefined) throw new RangeError(`moveMotion: motion ${from}, there are ${motions.length}`);
  motions.splice(to, 0, moved);
  return { ...project, motions };
}

/** Leaves a motion out, with the reason, or brings it back. */
export function useMotion(project: Project, at: number, used: boolean, reason?: string): Project {
  return {
    ...project,
    motions: project.motions.map((motion, i) => {
      if (i !== at) return motion;
      const { reason: before, ...rest } = motion;
      const why = reason ?? before;
      return used ? { ...rest, used } : { ...rest, used, ...(why === undefined ? {} : { reason: why }) };
    }),
  };
}

/** Half the step, where one is typed in seconds or in parts; a step that is chosen by halving stays so. */
export function halvedStep(project: Project): Project {
  const { step } = project.analysis;
  if (typeof step !== 'number' && (typeof step !== 'object' || step === null)) return project;
  const half = typeof step === 'number' ? step / 2 : { parts: 2 * step.parts };
  return { ...project, analysis: { ...project.analysis, step: half } };
}

/** Without its role: one isolator is all that a frame can have. */
function plain(row: StoreyRow): StoreyRow {
  const { role, ...rest } = row;
  return role === 'isolator' ? rest : row;
}

function withStoreys(project: Project, storeys: readonly StoreyRow[]): Project {
  return { ...project, frame: { ...project.frame, storeys } };
}
