/**
 * The record of a storey and the floor on top of it: all that a step reads and writes of them, side by side in one flat array.
 * Record i begins at i x STRIDE, ground up. Kept in an array a quantity, the linear loop took a third longer in Chromium (too
 * many base addresses for the registers).
 *
 * A hot file takes the places that it uses into constants of its own (`const { U, V } = FIELD;` at its top): looked up in an
 * import at each use they cost half the speed where modules are not bundled (Node).
 */
// biome-ignore format: a table, a line a group
const PLACES = [
  /** Floor mass [kg] and its inverse; initial stiffness less P-Delta [N/m]; initial stiffness x height [N]. */
  'MASS', 'PER_MASS', 'STIFFNESS', 'LEVER',
  /** Dashpots to the ground and between floors [N s/m]. */
  'FLOOR_DASHPOT', 'STOREY_DASHPOT',
  /** Factors of the step's matrix: multiplier and inverse pivot. */
  'MULTIPLIER', 'PER_PIVOT',
  /** State [m, m/s, m/s2] and scratch: right-hand side, part-solved; the next a. */
  'U', 'V', 'A', 'RHS', 'NEXT',
  /** Damping force on the floor, C v [N]; C a, carried for full matrices [N/s]; total acceleration [m/s2]. */
  'DAMPING_FORCE', 'DAMPING_RATE', 'TOTAL',
  /** Largest magnitudes so far, and the step of the drift's. */
  'PEAK_DRIFT', 'PEAK_STEP', 'PEAK_OVERTURNING', 'PEAK_U', 'PEAK_V', 'PEAK_TOTAL',
  /** Drift at which the run is stopped [m]. */
  'STOP',
  /** Over the last fundamental period: sum, least and largest of the signed drift [m]. */
  'DRIFT_SUM', 'DRIFT_LEAST', 'DRIFT_MOST',

  // From here on: nonlinear frames only.
  /** Of C v, the part of a full matrix [N]. */
  'FULL_FORCE',
  /** Storey height [m]; gravity above / height [N/m]. */
  'HEIGHT', 'P_OVER_H',
  /** The law: its number (laws/laws.ts), initial and post-yield stiffness [N/m], strength [N], three more of its own. */
  'LAW', 'K', 'K_YIELD', 'STRENGTH', 'LAW_P', 'LAW_Q', 'LAW_R',
  /** Its state at the end of the last step: drift [m], force [N], four of its own; restoring work so far [J]. */
  'DRIFT', 'FORCE', 'LAW_A', 'LAW_B', 'LAW_C', 'LAW_D', 'WORK',
  /** What it says of a trial drift [m]: force [N] and tangent [N/m]. */
  'TRIAL_DRIFT', 'TRIAL_FORCE', 'TANGENT',
  /** The straight line that the solve takes for it, force = INTERCEPT + SLOPE x drift, and the force it may be off by [N]. */
  'INTERCEPT', 'SLOPE', 'FORCE_TOLERANCE',
  /** The damper: coefficient, exponent, trial velocity [m/s] and force [N], its straight line, and its force and work so far. */
  'DAMPER', 'EXPONENT', 'TRIAL_RATE', 'TRIAL_DAMPER', 'DAMPER_INTERCEPT', 'DAMPER_SLOPE', 'DAMPER_FORCE', 'DAMPER_WORK',
  /** Drift of the damper at the end of the last step [m]. */
  'LAST_DRIFT',
  /** Steepest line of the damper [N s/m]; largest drift velocity so far [m/s]. */
  'STICK', 'PEAK_RATE',
  /** What the storey carries at the last step: law, P-Delta, dashpot and damper [N]; a1 of tangent damping [s]. */
  'STOREY_FORCE', 'TANGENT_FACTOR',
  /** Factor of the storey on the drift acceleration in the step's matrix [kg]. */
  'COUPLING',
  /** All of a storey's lines as one: force at rest [N], by drift [N/m], by its rate [N s/m]. */
  'LINE', 'LINE_DRIFT', 'LINE_RATE',
  /** The new u and v. */
  'NEXT_U', 'NEXT_V',
  /** Largest storey shear [N]; step of first yield, 0 for never. */
  'PEAK_SHEAR', 'YIELD_STEP',
] as const;

type Place = (typeof PLACES)[number];

/** The place of each quantity in a record, and the length of a record. */
export const FIELD = Object.freeze({
  ...(Object.fromEntries(PLACES.map((place, i) => [place, i])) as Record<Place, number>),
  STRIDE: PLACES.length,
});

/** Places in the sums that a slice of the march hands to the next one. Energies are doubled there [J]. */
export const SUM = Object.freeze({
  INPUT: 0,
  DAMPING: 1,
  KINETIC: 2,
  STRAIN: 3,
  LARGEST_GAP: 4,
  LARGEST_INPUT: 5,
  STOPPED: 6,
  /** Of nonlinear frames: solves so far, most in a step, halvings, storey that did not converge. */
  SOLVES: 7,
  MOST_SOLVES: 8,
  HALVINGS: 9,
  CULPRIT: 10,
  /** Largest |sum of the floors' damping forces| since a storey first yielded [N], and 1 once one has. */
  DAMPING_SHEAR: 11,
  YIELDED: 12,
  /** Steps summed for the residual. */
  SETTLED: 13,
  SUMS: 14,
});

/** What STOPPED says: under way, a storey passed its stop drift, the numbers left the finite range, a step did not converge. */
export const STATE = Object.freeze({ GOING: 0, COLLAPSED: 1, DIVERGED: 2, NOT_CONVERGED: 3 });

/**
 * Numbers of the scheme at the step or part of a step under way, as Method, h [s], and the ground acceleration at its start and
 * end [m/s2]: in an array, since a number handed to a function that is not inlined would be boxed.
 */
export const NOW = Object.freeze({ AM: 0, AF: 1, BETA: 2, GAMMA: 3, H: 4, AG_OLD: 5, AG_NEW: 6, NOWS: 7 });
