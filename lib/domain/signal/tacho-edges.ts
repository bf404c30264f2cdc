import { fail, ok, type Failure, type Result } from '../result';

/** Which flank of the pulse is the instant the mark reaches the tacho. */
export type TachoFlank = 'rising' | 'falling';

/** Instants the mark reached the tacho, seconds from the first sample. */
export type TachoEdges = {
  readonly edgesS: Float64Array;
  readonly kind: 'two-level' | 'analogue';
};

/**
 * Edges of a tacho column sampled with the record. A two-level column (0/1 or any two values) shows
 * an edge at the first sample after it, on average half a sample late, so half a sample is taken off.
 * An analogue column is armed below 40 % of its range, fires above 60 %, and its edge is where the
 * straight line between two samples crosses 50 %. Fails when the column never changes or has no
 * such flank.
 *
 * Example: `[0, 0, 1, 1, 0]` at 1 Hz has one rising edge, at 1.5 s.
 */
export function tachoEdges(
  tacho: Float64Array,
  sampleRateHz: number,
  flank: TachoFlank = 'rising',
): Result<TachoEdges, Failure<'TACHO_FLAT' | 'TACHO_WITHOUT_EDGES'>> {
  const lowest = tacho.reduce((low, value) => Math.min(low, value), Infinity);
  const highest = tacho.reduce((high, value) => Math.max(high, value), -Infinity);
  if (!(highest > lowest)) {
    return fail(
      'TACHO_FLAT',
      'The tacho column never changes: check that the sensor sees the mark and record again.',
      'tacho',
    );
  }
  const sign = flank === 'rising' ? 1 : -1;
  const level = { middle: (lowest + highest) / 2, reach: (highest - lowest) * 0.1, sign };
  const twoLevel = tacho.every((value) => value === lowest || value === highest);
  const positions = twoLevel ? stepPositions(tacho, level) : crossings(tacho, level);
  if (positions.length === 0) {
    return fail(
      'TACHO_WITHOUT_EDGES',
      `The tacho column has no ${flank} edge: choose the other flank or record for longer.`,
      'tacho',
    );
  }
  return ok({
    edgesS: Float64Array.from(positions, (position) => position / sampleRateHz),
    kind: twoLevel ? 'two-level' : 'analogue',
  });
}

type Level = { readonly middle: number; readonly reach: number; readonly sign: number };

function stepPositions(tacho: Float64Array, { middle, sign }: Level): number[] {
  const positions: number[] = [];
  for (let i = 1; i < tacho.length; i++) {
    const before = sign * ((tacho[i - 1] ?? 0) - middle);
    const after = sign * ((tacho[i] ?? 0) - middle);
    if (before < 0 && after > 0) positions.push(i - 0.5);
  }
  return positions;
}

function crossings(tacho: Float64Array, { middle, reach, sign }: Level): number[] {
  const positions: number[] = [];
  let armed = false;
  let crossing = 0;
  let before = sign * ((tacho[0] ?? 0) - middle);
  for (let i = 1; i < tacho.length; i++) {
    const now = sign * ((tacho[i] ?? 0) - middle);
    if (before < -reach) armed = true;
    if (before < 0 && now >= 0) crossing = i - 1 + before / (before - now);
    if (armed && now > reach) {
      positions.push(crossing);
      armed = false;
    }
    before = now;
  }
  return positions;
}
