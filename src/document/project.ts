import type { MethodChoice, StepChoice } from '../core/dynamics/run.ts';
import type { Origin } from '../core/motion/motion.ts';

/**
 * The saved project as the browser holds it. Same keys and units (SI) as the project file, with two differences: a
 * number may still be null (not typed) or the raw text of a cell that cannot be read, and a motion's samples live beside
 * the document by digest. Immutable: every edit makes a new object and shares what did not change.
 */
export type Typed = number | null | string;

/** Laws as the project file names them; what the numbers mean is said in core/frame/frame.ts. */
export type LawRow =
  | { readonly kind: 'elastic' }
  | { readonly kind: 'bilinear'; readonly strength: Typed; readonly hardening: Typed }
  | { readonly kind: 'peak-oriented'; readonly strength: Typed; readonly hardening: Typed }
  | {
      readonly kind: 'bouc-wen';
      readonly strength: Typed;
      readonly hardening: Typed;
      readonly exponent: Typed;
      readonly beta: Typed;
      readonly gamma: Typed;
    }
  | { readonly kind: 'flag'; readonly strength: Typed; readonly hardening: Typed; readonly ratio: Typed };

export interface StoreyRow {
  readonly name: string;
  readonly height: Typed;
  readonly mass: Typed;
  readonly stiffness: Typed;
  readonly law: LawRow;
  /** Absent: mass x g. */
  readonly gravity?: Typed;
  readonly damper?: { readonly coefficient: Typed; readonly exponent: Typed };
  /** Absent: storey. The first storey only may be an isolator. */
  readonly role?: 'storey' | 'isolator';
}

export type DampingRow =
  | { readonly kind: 'none' }
  | {
      readonly kind: 'rayleigh';
      readonly modes: readonly [Typed, Typed];
      readonly ratios: readonly [Typed, Typed];
      readonly stiffness?: 'initial' | 'tangent';
    }
  | { readonly kind: 'modal'; readonly ratios: readonly Typed[] }
  | { readonly kind: 'stiffness-proportional'; readonly mode: Typed; readonly ratio: Typed };

export interface MotionEntry {
  readonly name: string;
  /** [s] */
  readonly interval: number;
  /** Digest of the samples [m/s2], which live in the sample store. */
  readonly samples: string;
  /** Number of samples. */
  readonly count: number;
  readonly scale: Typed;
  readonly used: boolean;
  /** Why it is left out; asked for where used is false. */
  readonly reason?: string;
  readonly origin?: Origin;
}

export interface AnalysisRow {
  readonly method: MethodChoice;
  readonly step: StepChoice | null | string;
  readonly tail: Typed;
  readonly stopDrift: Typed;
}

export interface LimitsRow {
  readonly drift: Typed;
  readonly measure?: 'mean' | 'median' | 'max';
  readonly factor: Typed;
  readonly source: string;
  /** Displacement that an isolator may reach [m]; absent: not compared. */
  readonly isolator?: Typed;
}

export interface Project {
  readonly title: string;
  readonly frame: { readonly storeys: readonly StoreyRow[]; readonly damping: DampingRow; readonly pDelta: boolean };
  readonly motions: readonly MotionEntry[];
  readonly analysis: AnalysisRow;
  readonly limits: LimitsRow;
}

export const PROJECT_FORMAT = 'swaybook';
export const PROJECT_VERSION = 2;
export const MAX_STOREYS = 60;
