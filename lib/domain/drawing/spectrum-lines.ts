/** One line of a spectrum by its number. */
export type Line = { readonly index: number; readonly value: number };

/** A stretch of lines, both ends included. */
export type LineRange = { readonly from: number; readonly to: number };

/**
 * Lines reduced to what a screen can show: the largest line of each of `columns` equal stretches, so
 * that no peak is lost. At most `columns` lines come back as they are.
 *
 * Example: `columnMaxima([1, 5, 2, 3], { from: 0, to: 3 }, 2)` gives lines 1 and 3.
 */
export function columnMaxima(values: readonly number[], range: LineRange, columns: number): Line[] {
  const from = Math.max(0, range.from);
  const count = Math.min(values.length - 1, range.to) - from + 1;
  const lines: Line[] = [];
  const shown = Math.min(columns, count);
  for (let column = 0; column < shown; column++) {
    const start = from + Math.floor((column * count) / shown);
    const end = from + Math.floor(((column + 1) * count) / shown);
    lines.push(largest(values, start, end));
  }
  return lines;
}

/**
 * The `count` largest lines that stand above both neighbours, largest first. The first and last line
 * are never peaks.
 *
 * Example: `highestPeaks([0, 3, 0, 5, 0], 1)` is `[{ index: 3, value: 5 }]`.
 */
export function highestPeaks(values: readonly number[], count: number): Line[] {
  const peaks: Line[] = [];
  for (let index = 1; index < values.length - 1; index++) {
    const value = values[index] ?? 0;
    if (value > (values[index - 1] ?? 0) && value >= (values[index + 1] ?? 0))
      peaks.push({ index, value });
  }
  return peaks.sort((a, b) => b.value - a.value).slice(0, count);
}

function largest(values: readonly number[], from: number, to: number): Line {
  let best = { index: from, value: values[from] ?? 0 };
  for (let index = from + 1; index < to; index++) {
    const value = values[index] ?? 0;
    if (value > best.value) best = { index, value };
  }
  return best;
}
