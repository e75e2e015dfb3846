import type { Limits } from '../core/checks/limits.ts';
import type { PreparedFrame } from '../core/doors.ts';
import type { Analysis } from '../core/dynamics/run.ts';
import type { Result } from '../core/fault.ts';
import type { Frame } from '../core/frame/frame.ts';
import type { Project } from './project.ts';

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
 * The case of a document, or every reason why there is none (a cell not typed, not readable or out of range; a reference
 * to a mode that is not there; no storey; a step that is no whole part of an interval or beyond the stability limit; a
 * frame unstable under gravity). A frame without motions is a case (modes are still shown).
 */
export declare function caseOf(project: Project): Result<Case>;
