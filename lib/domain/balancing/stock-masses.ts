/** Masses are told apart to a tenth of a gram. */
const PER_G = 10;

/**
 * Every mass that can be put together from pieces of the given sizes, up to a limit; ascending, without 0.
 *
 * @param piecesG sizes in g, as many of each as are needed; told apart to 0.1 g
 * @returns g; empty where the smallest piece is above the limit
 * Source: definition. Example: pieces of 5 g up to 20 g give 5, 10, 15 and 20.
 */
export function stockMasses(piecesG: readonly number[], limitG: number): number[] {
  const limit = Math.floor(limitG * PER_G + 1e-6);
  const steps = piecesG.map((piece) => Math.round(piece * PER_G)).filter((step) => step > 0);
  const reachable = new Uint8Array(Math.max(0, limit) + 1);
  reachable[0] = 1;
  for (let mass = 1; mass <= limit; mass++)
    if (steps.some((step) => step <= mass && reachable[mass - step] === 1)) reachable[mass] = 1;
  const masses: number[] = [];
  for (let mass = 1; mass <= limit; mass++) if (reachable[mass] === 1) masses.push(mass / PER_G);
  return masses;
}
