/**
 * Inverts a symmetric positive definite matrix in its place, without allocating: Gauss-Jordan elimination on the diagonal.
 *
 * @param a  row-major n x n; symmetric on entry
 * @returns false where a pivot is not above 0 (NaN ends here too); `a` is then of no use
 * Source: Golub & Van Loan, Matrix Computations, chapter 4: no pivoting is needed for positive definite matrices (from memory).
 */
export function invertPositive(a: Float64Array, n: number): boolean {
  for (let k = 0; k < n; k++) {
    const pivot = a[k * n + k];
    if (!(pivot > 0)) return false;
    const inverse = 1 / pivot;
    for (let i = 0; i < n; i++) {
      if (i === k) continue;
      const factor = a[i * n + k] * inverse;
      if (factor === 0) continue;
      for (let j = 0; j < n; j++) if (j !== k) a[i * n + j] -= factor * a[k * n + j];
      a[i * n + k] = -factor;
    }
    for (let j = 0; j < n; j++) if (j !== k) a[k * n + j] *= inverse;
    a[k * n + k] = inverse;
  }
  return true;
}
