import type { Limits } from '../core/checks/limits.ts';
import { type PreparedFrame, prepareFrame } from '../core/doors.ts';
import type { Analysis } from '../core/dynamics/run.ts';
import type { Result } from '../core/fault.ts';
import type { Frame } from '../core/frame/frame.ts';
import { cellFaults } from './cells.ts';
import { inFileOrder } from './order.ts';
import type { Project } from './project.ts';
import { partFaults, stabilityFaults } from './stepFaults.ts';

/** The document as plain numbers: what the calculation needs and nothing else. */
export interface Case {
  readonly frame: Frame;
  /** Modes, matrices and damping of the frame, made once here. */
  readonly prepared: PreparedFrame;
  readonly analysis: Analysis;
  readonly limits: Limits;
  /** The used motions, in document order. */
  readonly motions: readonly {
    readonly name: string;
    readonly interval: number;
    readonly samples: string;
    readonly count: number;
    readonly scale: number;
  }[];
  /** Names of motions left out. */
  readonly leftOut: readonly string[];
}

/**
 * The case of a document, or every reason why there is none: a cell not typed, not readable or out of range; a reference to a
 * mode that is not there; no storey; a step that is no whole part of an interval or beyond the stability limit; a frame
 * unstable under gravity. A frame without motions is a case (modes are still shown).
 */
export function caseOf(project: Project): Result<Case> {
  const used = project.motions.filter((motion) => motion.used);
  const faults = cellFaults(project);
  const analysis = project.analysis as Analysis;
  if (!faults.some(({ where }) => where.startsWith('analysis'))) faults.push(...partFaults(used, analysis));
  if (faults.length > 0) return { ok: false, faults: inFileOrder(faults) };
  // Without a fault every cell holds its number.
  const frame = project.frame as Frame;
  const prepared = prepareFrame(frame);
  if (!prepared.ok) return prepared;
  const wrong = stabilityFaults(used, analysis, prepared.value);
  if (wrong.length > 0) return { ok: false, faults: wrong };
  return {
    ok: true,
    value: {
      frame,
      prepared: prepared.value,
      analysis,
      limits: project.limits as Limits,
      motions: used.map(({ name, interval, samples, count, scale }) => ({
        name,
        interval,
        samples,
        count,
        scale: Number(scale),
      })),
      leftOut: project.motions.filter((motion) => !motion.used).map(({ name }) => name),
    },
  };
}
