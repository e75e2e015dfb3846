import { never } from '../core/fault.ts';
import type { LawRow, Project, StoreyRow, Typed } from './project.ts';

/**
 * Edits of what a storey is made of, as pure functions: its law, its damper, its role.
 *
 * Starting values are our own, within common practice, and only so that a storey runs while its numbers are being typed: nothing
 * in them is a design.
 */
type Kind = LawRow['kind'];

/** Drift ratio at which a storey of unknown strength begins to yield. */
const YIELD_DRIFT_RATIO = 0.005;
/** Post-yield over initial stiffness. */
const HARDENING = 0.03;
/** Height of the flag over the strength. */
const FLAG_RATIO = 0.5;
/** Bouc-Wen: a smooth yield, and unloading at the initial stiffness. */
const BOUC_WEN = { exponent: 2, beta: 0.5, gamma: 0.5 } as const;

/**
 * Gives storeys another law. Strength and hardening stay where the old law has them; what a storey lacks gets a starting value: a
 * strength from a yield drift of 0.5 % of the height (two figures; empty while height or stiffness is), hardening 3 %.
 */
export function setLaw(project: Project, storeys: readonly number[], kind: Kind): Project {
  return withRows(project, storeys, (row) => (row.law.kind === kind ? row : { ...row, law: lawOf(row, kind) }));
}

function lawOf(row: StoreyRow, kind: Kind): LawRow {
  const { law } = row;
  const strength = 'strength' in law ? law.strength : startingStrength(row);
  const hardening = 'hardening' in law ? law.hardening : HARDENING;
  switch (kind) {
    case 'elastic':
      return { kind };
    case 'bilinear':
    case 'peak-oriented':
      return { kind, strength, hardening };
    case 'bouc-wen':
      return { kind, strength, hardening, ...BOUC_WEN };
    case 'flag':
      return { kind, strength, hardening, ratio: startingFlag(hardening) };
    default:
      return never(kind);
  }
}

function startingStrength({ height, stiffness }: StoreyRow): Typed {
  if (typeof height !== 'number' || typeof stiffness !== 'number') return null;
  return rounded(YIELD_DRIFT_RATIO * height * stiffness);
}

/** No more than re-centres. */
function startingFlag(hardening: Typed): number {
  return typeof hardening === 'number' && 1 - hardening < FLAG_RATIO ? Math.max(0, 1 - hardening) : FLAG_RATIO;
}

/** Two figures. */
function rounded(value: number): number {
  return Number(value.toPrecision(2));
}

/**
 * Drift velocity per unit of stiffness that a starting damper is made for [s], a storey of the frame: c = 2 zeta k / w with 5 % of
 * critical and a first period of 0.1 s a storey (both rough common practice). The exact ratio follows from the frame's own modes.
 */
const DAMPER_TIME = (2 * 0.05 * 0.1) / (2 * Math.PI);

/**
 * Gives storeys a damper. Left out: a linear one, whose coefficient starts at about 5 % of critical in a frame of usual period
 * (two figures; empty while the stiffness is), and a storey that has a damper keeps it.
 */
export function setDamper(project: Project, storeys: readonly number[], damper?: StoreyRow['damper']): Project {
  const time = DAMPER_TIME * project.frame.storeys.length;
  return withRows(project, storeys, (row) => {
    if (damper === undefined && row.damper !== undefined) return row;
    const coefficient = typeof row.stiffness === 'number' ? rounded(time * row.stiffness) : null;
    return { ...row, damper: damper ?? { coefficient, exponent: 1 } };
  });
}

export function clearDamper(project: Project, storeys: readonly number[]): Project {
  return withRows(project, storeys, ({ damper: _, ...rest }) => rest);
}

/** Makes a storey an isolator, or a storey again; `caseOf` says where an isolator cannot stand. */
export function setRole(project: Project, storey: number, role: 'storey' | 'isolator'): Project {
  return withRows(project, [storey], (row) => {
    const { role: _, ...rest } = row;
    return role === 'isolator' ? { ...rest, role } : rest;
  });
}

function withRows(project: Project, storeys: readonly number[], edit: (row: StoreyRow) => StoreyRow): Project {
  const chosen = new Set(storeys);
  const rows = project.frame.storeys.map((row, i) => (chosen.has(i) ? edit(row) : row));
  return { ...project, frame: { ...project.frame, storeys: rows } };
}
