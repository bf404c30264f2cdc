/** A run of equal samples: where it starts (counted from 0) and how long it is. */
export type Run = { readonly from: number; readonly length: number };

const EXTREME_RUN_MIN = 3;
const DROPPED_RUN_MIN = 16;

/**
 * At how many places the record stays at its highest or lowest value for at least 3 samples, as a
 * signal cut off by its range does. A coarse record whose rounded top is flat is told apart by its
 * neighbours: into a cut-off top it jumps, onto a rounded one it climbs by one step of resolution.
 *
 * Example: `[0, 5, 5, 5, 0, 5, 5, 5, 0]` has 2.
 */
export function clippedPlaces(samples: Float64Array): number {
  const { lowest, highest, resolution } = scan(samples);
  if (highest === lowest) return 0;
  const jumps = (a: number | undefined, b: number | undefined): boolean =>
    a !== undefined && b !== undefined && Math.abs(a - b) > 1.5 * resolution;
  return runsOfEquals(samples, EXTREME_RUN_MIN).filter(({ from, length }) => {
    const value = samples[from];
    if (value !== lowest && value !== highest) return false;
    const onlyTwoLevels = resolution >= highest - lowest;
    const end = from + length;
    return onlyTwoLevels || jumps(samples[from - 1], value) || jumps(samples[end], value);
  }).length;
}

/**
 * The longest run of at least 16 equal samples that is not at an extreme, as lost samples leave it;
 * null if there is none. A record whose rms is under 8 steps of its resolution stays equal by
 * itself and is not judged.
 */
export function droppedSamples(samples: Float64Array, rms: number): Run | null {
  const { lowest, highest, resolution } = scan(samples);
  if (highest === lowest || rms < 8 * resolution) return null;
  return runsOfEquals(samples, DROPPED_RUN_MIN)
    .filter(({ from }) => samples[from] !== lowest && samples[from] !== highest)
    .reduce<Run | null>(
      (longest, run) => (longest === null || run.length > longest.length ? run : longest),
      null,
    );
}

function scan(samples: Float64Array): { lowest: number; highest: number; resolution: number } {
  let lowest = Infinity;
  let highest = -Infinity;
  let resolution = Infinity;
  let before = samples[0] ?? 0;
  for (const value of samples) {
    if (value < lowest) lowest = value;
    if (value > highest) highest = value;
    const step = Math.abs(value - before);
    if (step > 0 && step < resolution) resolution = step;
    before = value;
  }
  return { lowest, highest, resolution };
}

function runsOfEquals(samples: Float64Array, lengthMin: number): Run[] {
  const runs: Run[] = [];
  let from = 0;
  for (let i = 1; i <= samples.length; i++) {
    if (samples[i] === samples[from]) continue;
    if (i - from >= lengthMin) runs.push({ from, length: i - from });
    from = i;
  }
  return runs;
}
