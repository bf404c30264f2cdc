import { Matrix, pseudoInverse as realPseudoInverse, SingularValueDecomposition } from 'ml-matrix';
import { add, multiply, scale, size, ZERO, type Complex } from '../complex';

/** A complex matrix, row by row. */
export type ComplexMatrix = readonly (readonly Complex[])[];

/** Sum of the products of two vectors, without conjugation. Example: (1, 2)·(3, 4) is 11. */
export function dot(a: readonly Complex[], b: readonly Complex[]): Complex {
  return a.reduce((total, value, i) => add(total, multiply(value, b[i] ?? ZERO)), ZERO);
}

/** The matrix times a vector. Example: `apply([[one, one]], [a, b])` is `[a + b]`. */
export function apply(matrix: ComplexMatrix, vector: readonly Complex[]): Complex[] {
  return matrix.map((row) => dot(row, vector));
}

/** Column `index` of a matrix. */
export function columnOf(matrix: ComplexMatrix, index: number): Complex[] {
  return matrix.map((row) => row[index] ?? ZERO);
}

/** Euclidean length of a vector, `√Σ|zᵢ|²`. Example: the length of (3, 4j) is 5. */
export function norm(vector: readonly Complex[]): number {
  return Math.hypot(...vector.map(size));
}

/**
 * Singular values of a complex matrix, largest first, as many as its smaller side. Taken from the
 * real matrix [Re −Im; Im Re], which has each of them twice.
 * Source: numerical textbooks. Example: of the 1×1 matrix (3 + 4j) it is `[5]`.
 */
export function singularValues(matrix: ComplexMatrix): number[] {
  const twice = new SingularValueDecomposition(embed(matrix), { autoTranspose: true }).diagonal;
  return twice.filter((_, i) => i % 2 === 0);
}

/**
 * Singular values after each column was brought to length one, so that neither the unit nor the
 * radius of a plane plays a part. A column of zeros stays as it is.
 * Source: numerical textbooks (column equilibration).
 */
export function scaledSingularValues(matrix: ComplexMatrix): number[] {
  return singularValues(scaleColumns(matrix, columnScales(matrix)));
}

/**
 * Pseudo-inverse A⁺ of a matrix of full column rank (columns × rows): `A⁺·b` minimises ‖A·x − b‖₂.
 * Columns are brought to length one before, which leaves the result as it is and saves digits.
 * Source: numerical textbooks (SVD). Example: of the 1×1 matrix (2) it is (0.5).
 */
export function pseudoInverse(matrix: ComplexMatrix): ComplexMatrix {
  const scales = columnScales(matrix);
  const inverse = realPseudoInverse(embed(scaleColumns(matrix, scales)), 1e-13);
  const rows = matrix.length;
  return scales.map((factor, i) =>
    Array.from({ length: rows }, (_, k) =>
      scale({ re: inverse.get(i, k), im: inverse.get(i + scales.length, k) }, factor),
    ),
  );
}

function columnScales(matrix: ComplexMatrix): number[] {
  const columns = matrix[0]?.length ?? 0;
  return Array.from({ length: columns }, (_, i) => {
    const length = norm(columnOf(matrix, i));
    return length > 0 ? 1 / length : 1;
  });
}

function scaleColumns(matrix: ComplexMatrix, scales: readonly number[]): ComplexMatrix {
  return matrix.map((row) => row.map((value, i) => scale(value, scales[i] ?? 1)));
}

function embed(matrix: ComplexMatrix): Matrix {
  const upper = matrix.map((row) => [...row.map((z) => z.re), ...row.map((z) => -z.im)]);
  const lower = matrix.map((row) => [...row.map((z) => z.im), ...row.map((z) => z.re)]);
  return new Matrix([...upper, ...lower]);
}
