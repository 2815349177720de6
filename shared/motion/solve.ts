/**
 * Solves `matrix * x = right` for a symmetric positive definite matrix (row by row, size n) by Cholesky's method, in place:
 * the matrix becomes its factor, `right` becomes x. False when the matrix is not positive definite.
 */
export function solveCholesky(matrix: Float64Array, right: Float64Array, n: number): boolean {
  if (!factorCholesky(matrix, n)) return false;
  substitute(matrix, right, n);
  return true;
}

/** Cholesky's factor L (lower, in place). False when the matrix is not positive definite. */
export function factorCholesky(matrix: Float64Array, n: number): boolean {
  for (let j = 0; j < n; j += 1) {
    const row = j * n;
    let pivot = matrix[row + j]!;
    for (let k = 0; k < j; k += 1) pivot -= matrix[row + k]! * matrix[row + k]!;
    if (!(pivot > 0)) return false;
    const root = Math.sqrt(pivot);
    matrix[row + j] = root;
    for (let i = j + 1; i < n; i += 1) {
      const other = i * n;
      let sum = matrix[other + j]!;
      for (let k = 0; k < j; k += 1) sum -= matrix[other + k]! * matrix[row + k]!;
      matrix[other + j] = sum / root;
    }
  }
  return true;
}

/** Solves with a factor made by `factorCholesky`; `right` becomes the answer. */
export function substitute(factor: Float64Array, right: Float64Array, n: number): void {
  for (let i = 0; i < n; i += 1) {
    let sum = right[i]!;
    for (let k = 0; k < i; k += 1) sum -= factor[i * n + k]! * right[k]!;
    right[i] = sum / factor[i * n + i]!;
  }
  for (let i = n - 1; i >= 0; i -= 1) {
    let sum = right[i]!;
    for (let k = i + 1; k < n; k += 1) sum -= factor[k * n + i]! * right[k]!;
    right[i] = sum / factor[i * n + i]!;
  }
}
