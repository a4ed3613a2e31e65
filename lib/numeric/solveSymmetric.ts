/**
 * Solution x of A x = b for a symmetric, positive definite matrix: Cholesky decomposition. A pivot that is nearly zero, as
 * when two columns say the same, leaves its unknown at zero.
 * @param matrix square; only the lower triangle is read, nothing is written
 */
export function solveSymmetric(matrix: readonly Float64Array[], right: Float64Array): Float64Array {
  const size = right.length;
  const lower = matrix.map((row) => Float64Array.from(row));
  for (let j = 0; j < size; j++) {
    let pivot = matrix[j][j];
    for (let k = 0; k < j; k++) pivot -= lower[j][k] * lower[j][k];
    const root = pivot > 1e-9 * matrix[j][j] ? Math.sqrt(pivot) : 0;
    lower[j][j] = root;
    for (let i = j + 1; i < size; i++) {
      let sum = matrix[i][j];
      for (let k = 0; k < j; k++) sum -= lower[i][k] * lower[j][k];
      lower[i][j] = root > 0 ? sum / root : 0;
    }
  }
  const x = Float64Array.from(right);
  for (let i = 0; i < size; i++) {
    for (let k = 0; k < i; k++) x[i] -= lower[i][k] * x[k];
    x[i] = lower[i][i] > 0 ? x[i] / lower[i][i] : 0;
  }
  for (let i = size - 1; i >= 0; i--) {
    for (let k = i + 1; k < size; k++) x[i] -= lower[k][i] * x[k];
    x[i] = lower[i][i] > 0 ? x[i] / lower[i][i] : 0;
  }
  return x;
}
