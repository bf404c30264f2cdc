/**
 * A round size for the outer circle of a polar plot: the next 1, 2, 3 or 5 times a power of ten; 1 where
 * there is nothing to show.
 *
 * Example: `outerCircle(2.4)` is 3, `outerCircle(0.071)` is 0.1.
 */
export function outerCircle(largest: number): number {
  if (largest <= 0) return 1;
  const power = 10 ** Math.floor(Math.log10(largest));
  return power * ([1, 2, 3, 5].find((step) => step * power >= largest) ?? 10);
}
