/**
 * Symmetric tridiagonal systems A x = b by A = L D L^T, in place, without pivoting: for matrices that are positive definite.
 *   diag d, off e: A[i][i] = d[i], A[i][i-1] = A[i-1][i] = e[i]; e[0] is unused.
 * Source: Golub & Van Loan, Matrix Computations, section 4.3 (section number from memory).
 */

/** Reciprocal pivots and multipliers of the factors, length n each; multiplier[0] is 0. */
export interface TridiagonalFactors {
  readonly pivotInverse: Float64Array;
  readonly multiplier: Float64Array;
}

/**
 * Factors a matrix given by diagonal and off-diagonal.
 *
 * @param diagonal  length n
 * @param off       length n, off[0] unused
 * @returns the factors, or the first row whose pivot is not > 0 (NaN ends here too)
 */
export function factorTridiagonal(
  diagonal: Float64Array,
  off: Float64Array,
): TridiagonalFactors | { readonly row: number } {
  const n = diagonal.length;
  const pivotInverse = new Float64Array(n);
  const multiplier = new Float64Array(n);
  let previous = 0;
  for (let i = 0; i < n; i++) {
    const l = i === 0 ? 0 : off[i] / previous;
    const pivot = i === 0 ? diagonal[0] : diagonal[i] - l * off[i];
    if (!(pivot > 0)) return { row: i };
    multiplier[i] = l;
    pivotInverse[i] = 1 / pivot;
    previous = pivot;
  }
  return { pivotInverse, multiplier };
}

/** Solves L D L^T x = b. `b` and `out` may be the same array. */
export function solveTridiagonalInto(factors: TridiagonalFactors, b: Float64Array, out: Float64Array): void {
  const { pivotInverse, multiplier } = factors;
  const n = pivotInverse.length;
  let carry = 0;
  for (let i = 0; i < n; i++) {
    carry = b[i] - multiplier[i] * carry;
    out[i] = carry;
  }
  carry = out[n - 1] * pivotInverse[n - 1];
  out[n - 1] = carry;
  for (let i = n - 2; i >= 0; i--) {
    carry = out[i] * pivotInverse[i] - multiplier[i + 1] * carry;
    out[i] = carry;
  }
}
