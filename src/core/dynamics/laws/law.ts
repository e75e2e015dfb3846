/**
 * How a storey answers its drift, on the flat state of its record (record.ts). All four work on w[at + ...] only: they take and
 * return no numbers with a fraction, so that nothing is allocated when they are called.
 *
 * Within a step the drift is taken to go straight from DRIFT to TRIAL_DRIFT; the force follows the law's own path on the way.
 */
export interface LawBehaviour {
  /** Virgin state at zero drift: writes LAW_A to LAW_D where it uses them; DRIFT, FORCE and WORK are zero already. */
  begin(w: Float64Array, at: number): void;
  /** From the state and TRIAL_DRIFT: writes TRIAL_FORCE and the consistent TANGENT, d TRIAL_FORCE / d TRIAL_DRIFT; the state stays. */
  trial(w: Float64Array, at: number): void;
  /** Takes the trial (its force is in TRIAL_FORCE): adds the work of the path to WORK, moves the state, DRIFT and FORCE there. */
  commit(w: Float64Array, at: number): void;
  /** Energy that unloading would give back from the state, written to w[out] [J]. */
  recoverable(w: Float64Array, at: number, out: number): void;
}
