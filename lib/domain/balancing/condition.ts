import { scaledSingularValues, type ComplexMatrix } from './complex-matrix';

/** How much the choice of planes and points blows up an error. */
export type Condition = {
  /** Largest over smallest singular value, columns brought to one length; at most 1e9. */
  readonly number: number;
  readonly verdict: 'good' | 'caution' | 'withhold';
};

/** Good below, exact answer withheld above (practice; no published source). */
const CAUTION = 5;
const WITHHOLD = 15;
/** Beyond this the planes are the same to every point, whatever the digits say. */
const TOP = 1e9;

/**
 * Scaled condition number of the coefficients (rows: points, columns: planes), with the verdict of
 * the trade's practice: below 5 good, 5 to 15 caution, above 15 the exact answer is withheld.
 * Source: numerical textbooks (condition number); limits from practice.
 * Example: planes that both points feel in the same ratio have 1e9, `withhold`.
 */
export function conditionOf(coefficients: ComplexMatrix): Condition {
  const values = scaledSingularValues(coefficients);
  const largest = values[0] ?? 0;
  const smallest = values.at(-1) ?? 0;
  const number = smallest > largest / TOP ? largest / smallest : TOP;
  return { number, verdict: verdictOf(number) };
}

function verdictOf(number: number): Condition['verdict'] {
  if (number > WITHHOLD) return 'withhold';
  return number < CAUTION ? 'good' : 'caution';
}
