/**
 * Solves the square system `A·x = b` by Gaussian elimination with partial pivoting; A is row-major,
 * its size the length of `b`. A singular system gives non-finite values. Inputs are left unchanged.
 *
 * Example: `solveLinear([2, 0, 0, 4], [2, 2])` is `[1, 0.5]`.
 */
export function solveLinear(matrix: Float64Array, right: Float64Array): Float64Array {
  const n = right.length;
  const rows = Array.from({ length: n }, (_, i) =>
    Float64Array.of(...matrix.subarray(i * n, (i + 1) * n), right[i] ?? 0),
  );
  for (let column = 0; column < n; column++) eliminate(rows, column);
  const solution = new Float64Array(n);
  for (let i = n - 1; i >= 0; i--) {
    const row = rows[i] ?? new Float64Array(n + 1);
    let rest = row[n] ?? 0;
    for (let j = i + 1; j < n; j++) rest -= (row[j] ?? 0) * (solution[j] ?? 0);
    solution[i] = rest / (row[i] ?? 0);
  }
  return solution;
}

function eliminate(rows: Float64Array[], column: number): void {
  const below = rows.slice(column);
  const pivot = below.reduce((best, row) =>
    Math.abs(row[column] ?? 0) > Math.abs(best[column] ?? 0) ? row : best,
  );
  const from = rows.indexOf(pivot);
  rows[from] = rows[column] ?? pivot;
  rows[column] = pivot;
  for (const row of rows.slice(column + 1)) {
    const factor = (row[column] ?? 0) / (pivot[column] ?? 0);
    for (let j = column; j < row.length; j++) row[j] = (row[j] ?? 0) - factor * (pivot[j] ?? 0);
  }
}
