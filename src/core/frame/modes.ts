/** Modal properties of a frame; mode 1 has the longest period. */
export interface Mode {
  /** [s] */
  readonly period: number;
  /** Circular frequency [rad/s] */
  readonly frequency: number;
  /** Floor 1 first, 1 at the roof, length = storeys. */
  readonly shape: Float64Array;
  /** Participation factor of the shape above [-]. */
  readonly participation: number;
  /** [kg] */
  readonly effectiveMass: number;
  /** Share of the total mass [-]. */
  readonly effectiveMassRatio: number;
  /** Height at which the mode's base shear gives its base overturning [m]; may be negative. */
  readonly effectiveHeight: number;
}
