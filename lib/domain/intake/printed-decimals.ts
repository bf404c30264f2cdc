/**
 * How many decimals a column is printed with: the most seen in a sample of its cells, both decimal
 * marks and exponents understood; 0 when no cell is a number.
 *
 * Example: `0.000078` has 6, `7.8125e-05` has 9.
 */
export function printedDecimals(cells: readonly string[]): number {
  return cells.reduce((most, cell) => Math.max(most, decimalsOf(cell)), 0);
}

function decimalsOf(cell: string): number {
  const match = /^\s*[+-]?\d*(?:[.,](\d*))?(?:e([+-]?\d+))?\s*$/i.exec(cell);
  if (match === null) return 0;
  const [, fraction = '', exponent = '0'] = match;
  return fraction.length - Number(exponent);
}
