/** The zone of a value by boundaries A/B, B/C, C/D, written out apart from the product's own rule. */
export function judge(value: number, [ab, bc, cd]: readonly number[]): 'A' | 'B' | 'C' | 'D' {
  if (value > (cd ?? Infinity)) return 'D';
  if (value > (bc ?? Infinity)) return 'C';
  return value > (ab ?? Infinity) ? 'B' : 'A';
}
