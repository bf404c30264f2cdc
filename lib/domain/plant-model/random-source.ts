/** A source of numbers in [0, 1): the same seed gives the same numbers. */
export type RandomSource = () => number;

/**
 * Pseudo-random numbers from a 32-bit seed (mulberry32). For invented data only, never for secrets.
 * Source: T. Ettinger, mulberry32 (public domain).
 *
 * Example: two sources of seed 1 give the same series.
 */
export function randomSource(seed: number): RandomSource {
  let state = seed >>> 0;
  return () => {
    state = (state + 0x6d2b79f5) >>> 0;
    let mixed = Math.imul(state ^ (state >>> 15), state | 1);
    mixed ^= mixed + Math.imul(mixed ^ (mixed >>> 7), mixed | 61);
    return ((mixed ^ (mixed >>> 14)) >>> 0) / 4_294_967_296;
  };
}

/** One number of the standard normal distribution. Source: Box & Muller, 1958. */
export function normalFrom(random: RandomSource): number {
  // 1 − x keeps the logarithm from zero.
  const radius = Math.sqrt(-2 * Math.log(1 - random()));
  return radius * Math.cos(2 * Math.PI * random());
}
