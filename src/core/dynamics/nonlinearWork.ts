/** All that the step of a nonlinear frame works on, made once. */
export interface NonlinearWork {
  readonly n: number;
  /** n records. */
  readonly w: Float64Array;
  readonly now: Float64Array;
  /** Of the step [s]. */
  readonly h: number;
  /** Some storey has another law than elastic or bilinear, or a damper. */
  readonly smooth: boolean;
  /** Where damping is a full matrix: it, the inverse of the step's matrix, scratch. */
  readonly full: FullWork | null;
  readonly sums: Float64Array;
  /** 1 while the step's matrix is that of the step and the lines as they stand, 0 where it is not positive definite. */
  readonly holds: Uint8Array;
}

export interface FullWork {
  /** C, row-major n x n [N s/m]. */
  readonly damping: Float64Array;
  /** Inverse of the step's matrix with the couplings in the records, row-major n x n. */
  readonly inverse: Float64Array;
  /** Scratch of n each. */
  readonly side: Float64Array;
  readonly column: Float64Array;
  /** Updates of the inverse since it was last made afresh. */
  readonly updates: Int32Array;
}
