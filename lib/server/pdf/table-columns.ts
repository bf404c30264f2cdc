import 'server-only';

/** What a column would like, points: all on one line, and no word broken. */
export type ColumnWish = { readonly natural: number; readonly least: number };

/**
 * Widths of columns that fill `width`. Where not all can have what they would like, room beyond the
 * longest words goes to the columns that want least first, so that names and times stay on one line and
 * only long remarks are wrapped.
 */
export function columnWidths(wishes: readonly ColumnWish[], width: number): number[] {
  const natural = sumOf(wishes.map((wish) => wish.natural));
  const least = sumOf(wishes.map((wish) => wish.least));
  if (natural <= width) return wishes.map((wish) => wish.natural * (width / natural));
  if (least >= width) return wishes.map((wish) => wish.least * (width / least));
  const widths = wishes.map((wish) => wish.least);
  const byWant = wishes
    .map((wish, column) => ({ column, want: wish.natural - wish.least }))
    .sort((a, b) => a.want - b.want);
  let room = width - least;
  for (const [taken, { column, want }] of byWant.entries()) {
    const given = Math.min(want, room / (byWant.length - taken));
    widths[column] = (widths[column] ?? 0) + given;
    room -= given;
  }
  return widths;
}

function sumOf(values: readonly number[]): number {
  return values.reduce((all, value) => all + value, 0);
}
