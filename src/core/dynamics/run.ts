import type { Frame } from '../frame/frame.ts';

/** A scheme as the project file names it. */
export type MethodChoice =
  | { readonly kind: 'newmark'; readonly beta: number; readonly gamma: number }
  | { readonly kind: 'generalized-alpha'; readonly spectralRadius: number }
  | { readonly kind: 'hht'; readonly alpha: number }
  | { readonly kind: 'central-difference' };

/** Seconds; or so many parts of each motion's interval; or chosen by halving. */
export type StepChoice = number | { readonly parts: number } | 'auto';

export interface Analysis {
  readonly method: MethodChoice;
  readonly step: StepChoice;
  /** Free vibration computed after the last sample [s]. */
  readonly tail: number;
  /** Storey drift ratio at which a yielding or P-Delta run is stopped as collapsed. */
  readonly stopDrift: number;
}

/** One frame under one motion: everything that a run depends on. */
export interface RunCase {
  readonly frame: Frame;
  readonly analysis: Analysis;
  readonly motion: {
    /** [s] */
    readonly interval: number;
    /** As stored, before the scale [m/s2]. */
    readonly acceleration: Float64Array;
    readonly scale: number;
  };
}

/** What the march shall keep beside peaks, residuals and energies. */
export interface Want {
  readonly histories: boolean;
}

/**
 * Histories of one run. Storey-major: storey s is `displacement.subarray(s * count, (s + 1) * count)`. Entry j belongs to
 * t = j x every x step.
 */
export interface Histories {
  /** 1 = each step was kept; k = only each k-th, where all would pass the memory limit. */
  readonly every: number;
  readonly count: number;
  /** Scaled ground acceleration [m/s2], length count. */
  readonly ground: Float64Array;
  /** Floor displacement relative to the ground [m], storeys x count. */
  readonly displacement: Float64Array;
  /** Storey shear [N], storeys x count. */
  readonly shear: Float64Array;
  /** Total floor acceleration [m/s2], storeys x count. */
  readonly acceleration: Float64Array;
  /** Energies [J], length count each. */
  readonly energy: {
    readonly input: Float64Array;
    readonly kinetic: Float64Array;
    readonly strain: Float64Array;
    readonly damping: Float64Array;
    readonly dampers: Float64Array;
    readonly hysteretic: Float64Array;
  };
  /** Of frames that yield or have dampers; null for linear ones. */
  readonly nonlinear: {
    /** Force of the storey damper [N], a part of `shear`; storeys x count. */
    readonly damper: Float64Array;
    /** 1 where the storey is past yield (on its post-yield branch), storeys x count. */
    readonly yielding: Uint8Array;
  } | null;
}

export interface Ending {
  /**
   * `collapsed`: a storey passed stopDrift. `diverged`: the numbers left the finite range. `not-converged`: a step did not
   * converge however far it was halved. `cancelled`: superseded or stopped.
   */
  readonly status: 'collapsed' | 'diverged' | 'not-converged' | 'cancelled';
  /** Storey index, from 0; -1 where no single storey is to blame. */
  readonly storey: number;
  /** [s] */
  readonly time: number;
}

/** What one run answers. Arrays have one entry a storey (or the floor on top of it), ground up. Peaks are magnitudes. */
export interface Run {
  readonly method: MethodChoice;
  /** [s] */
  readonly step: number;
  /** Steps asked for; the run covers steps x step seconds. */
  readonly steps: number;
  /** null: ran to its end. */
  readonly ending: Ending | null;
  readonly storeys: {
    /** [m] */
    readonly peakDrift: Float64Array;
    /** Peak drift / storey height [-]. */
    readonly peakDriftRatio: Float64Array;
    /** When the peak drift was reached [s]. */
    readonly peakTime: Float64Array;
    /** Signed mean drift over the last fundamental period of the run [m]. */
    readonly residualDrift: Float64Array;
    /** Largest distance from that mean within that period [m]. */
    readonly residualSway: Float64Array;
    /** Restoring force and damper [N]. */
    readonly peakShear: Float64Array;
    /** max |sum of storey shear x height from this storey up| [N m] */
    readonly peakOverturning: Float64Array;
    /** Work of the restoring force that is not recoverable [J]. */
    readonly dissipated: Float64Array;
    /** Peak drift / yield drift [-]; NaN for elastic storeys. */
    readonly ductility: Float64Array;
    /** When the storey first passed its yield drift [s]; NaN where it never did. */
    readonly firstYield: Float64Array;
    /** Work taken by the storey damper [J]. */
    readonly damperWork: Float64Array;
  };
  readonly base: {
    /**
     * Largest |sum over the floors of the viscous force C v| while any storey is past yield [N]: what damping then adds to the
     * storeys' base shear. NaN for linear frames.
     */
    readonly peakDampingForce: number;
  };
  readonly floors: {
    /** Relative to the ground [m]. */
    readonly peakDisplacement: Float64Array;
    /** Relative to the ground [m/s]. */
    readonly peakVelocity: Float64Array;
    /** Total [m/s2]. */
    readonly peakAcceleration: Float64Array;
  };
  /** [J] at the end of the run, of relative motion; imbalance is a ratio. */
  readonly energy: {
    readonly input: number;
    readonly kinetic: number;
    readonly strain: number;
    readonly damping: number;
    readonly dampers: number;
    readonly hysteretic: number;
    readonly imbalance: number;
  };
  /** What the steps cost. Linear frames: one solve a step, no halving. */
  readonly marching: {
    /** Solves of the step's equations, all steps together. */
    readonly solves: number;
    /** Most solves of one step. */
    readonly mostSolves: number;
    /** Times that a step was halved because it did not converge. */
    readonly halvings: number;
  };
  readonly histories: Histories | null;
}
