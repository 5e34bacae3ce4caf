/** Dense matrices in plain arrays, for tests that hold the engine's low-rank algebra against the full one. */

/** x with A·x = b, and ln det A, by elimination with partial pivoting. */
export function solveDense(matrix: number[][], b: number[]): { x: number[]; logDeterminant: number } {
  const a = matrix.map((row, i) => [...row, b[i]]);
  const n = a.length;
  let logDeterminant = 0;
  for (let k = 0; k < n; k++) {
    let pivot = k;
    for (let i = k + 1; i < n; i++) if (Math.abs(a[i][k]) > Math.abs(a[pivot][k])) pivot = i;
    [a[k], a[pivot]] = [a[pivot], a[k]];
    logDeterminant += Math.log(Math.abs(a[k][k]));
    for (let i = k + 1; i < n; i++) {
      const factor = a[i][k] / a[k][k];
      for (let j = k; j <= n; j++) a[i][j] -= factor * a[k][j];
    }
  }
  const x = new Array<number>(n).fill(0);
  for (let i = n - 1; i >= 0; i--) {
    let rest = a[i][n];
    for (let j = i + 1; j < n; j++) rest -= a[i][j] * x[j];
    x[i] = rest / a[i][i];
  }
  return { x, logDeterminant };
}

export function dotDense(a: readonly number[], b: readonly number[]): number {
  return a.reduce((sum, value, i) => sum + value * b[i], 0);
}
