import { Matrix, SingularValueDecomposition } from 'ml-matrix';

/** Singular values of a square matrix, smallest first, with right singular vectors as rows of `vectors`. */
export interface SingularPairs {
  /** Ascending, length n. */
  readonly values: Float64Array;
  /** Row r (entries r n to r n + n - 1) is the unit right singular vector of value r; length n x n. */
  readonly vectors: Float64Array;
}

/**
 * Right singular pairs of R, that is, eigenpairs of R^T R without ever forming that product: the error of a small value is
 * that of the largest value times the machine epsilon, not of its square (a frame with one very stiff storey needs that).
 *
 * @param r  square matrix, row-major, n x n
 * @throws RangeError where an entry is not finite (the library may loop on NaN).
 * Source: Golub & Van Loan, Matrix Computations, section 8.6 (section number from memory), by the library ml-matrix.
 */
export function singularPairs(r: Float64Array, n: number): SingularPairs {
  requireFinite(r, 'singularPairs');
  const svd = new SingularValueDecomposition(toMatrix(r, n), {
    computeLeftSingularVectors: false,
    computeRightSingularVectors: true,
  });
  const { diagonal } = svd; // a copy, descending
  const v = svd.rightSingularVectors;
  const values = new Float64Array(n);
  const vectors = new Float64Array(n * n);
  for (let row = 0; row < n; row++) {
    const column = n - 1 - row;
    values[row] = diagonal[column];
    for (let i = 0; i < n; i++) vectors[row * n + i] = v.get(i, column);
  }
  return { values, vectors };
}

function toMatrix(a: Float64Array, n: number): Matrix {
  return new Matrix(Array.from({ length: n }, (_, i) => Array.from(a.subarray(i * n, i * n + n))));
}

function requireFinite(a: Float64Array, name: string): void {
  for (let i = 0; i < a.length; i++) {
    if (!Number.isFinite(a[i])) throw new RangeError(`${name}: entry ${i} is ${a[i]}, expected a finite number`);
  }
}
