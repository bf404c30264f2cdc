/** A row of words on a disc: where it begins if nothing were in its way, how wide it is, its height. */
export type DiscWords = { readonly left: number; readonly width: number; readonly y: number };

/**
 * Where a row of words begins so that it stays on a disc at its height, in the units of the drawing;
 * words wider than the disc is there are centred on it.
 *
 * @param disc centre and the radius that words keep to
 * Source: chord of a circle. @example on a disc of radius 90 at (160, 190), words 100 wide that would
 *   begin at 170 on the middle line begin at 150
 */
export function leftWithinDisc(
  { left, width, y }: DiscWords,
  disc: { readonly x: number; readonly y: number; readonly radius: number },
): number {
  const half = Math.sqrt(Math.max(0, disc.radius ** 2 - (y - disc.y) ** 2));
  if (width >= 2 * half) return disc.x - width / 2;
  return Math.min(Math.max(left, disc.x - half), disc.x + half - width);
}
