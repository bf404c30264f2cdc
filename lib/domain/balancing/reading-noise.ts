import { size, subtract, ZERO } from '../complex';
import { sizeFactor } from '../signal/quantity';
import type { JobInput } from './job-input';
import { repeatTest, type RepeatTest } from './repeat-test';
import { vectorsOf, type RunBlock } from './weight-steps';

/** Scatter of readings at one point. */
export type PointNoise = {
  readonly pointId: number;
  /** Deviation of one reading, in the job's unit; null where nothing is known. */
  readonly deviation: number | null;
  /** Largest distance of a repeat from its mean (or the scatter given); null where nothing is known. */
  readonly scatter: number | null;
  readonly from: 'repeats' | 'given' | 'unknown';
  /** Repeat test of the base runs; null where base was taken once. */
  readonly base: RepeatTest | null;
};

/** A lag read to whole degrees cannot repeat closer than 1°/√12, which is 0.5 % of the size. */
const READING_STEP = 0.005;
/** Scatter of this much is always good, mm/s rms (site default). */
const GOOD_SCATTER_MM_S = 0.1;

/**
 * Scatter of one reading per point, pooled over all blocks of runs that repeat a state; the scatter
 * given with the job where nothing was repeated. Never below 0.5 % of the base reading, because typed
 * readings are rounded.
 * Source: pooled standard deviation. Example: S08's four base runs have 0.154 mm/s.
 */
export function readingNoise(input: JobInput, blocks: readonly RunBlock[]): PointNoise[] {
  const base = blocks.find((block) => block.runs.some(({ purpose }) => purpose === 'base'));
  return input.points.map((point, p) => {
    const readings = (block: RunBlock) =>
      block.runs.map((run) => vectorsOf(run, input.points)[p] ?? ZERO);
    const pooled = pooledDeviation(blocks.map(readings));
    const floor = READING_STEP * size(base?.vectors[p] ?? ZERO);
    const test = base ? repeatTest(readings(base), goodScatter(input)) : null;
    if (pooled !== null) {
      const deviation = Math.max(pooled, floor);
      return {
        pointId: point.id,
        deviation,
        scatter: test?.scatter ?? deviation,
        from: 'repeats',
        base: test,
      };
    }
    const given = input.scatter ?? null;
    return {
      pointId: point.id,
      deviation: given === null ? null : Math.max(given, floor),
      scatter: given,
      from: given === null ? 'unknown' : 'given',
      base: null,
    };
  });
}

function pooledDeviation(
  groups: readonly (readonly { readonly re: number; readonly im: number }[])[],
): number | null {
  let squares = 0;
  let freedom = 0;
  for (const group of groups.filter((readings) => readings.length > 1)) {
    const mean = {
      re: group.reduce((total, v) => total + v.re, 0) / group.length,
      im: group.reduce((total, v) => total + v.im, 0) / group.length,
    };
    squares += group.reduce((total, v) => total + size(subtract(v, mean)) ** 2, 0);
    freedom += group.length - 1;
  }
  return freedom === 0 ? null : Math.sqrt(squares / freedom);
}

/** 0.1 mm/s rms, or the displacement p-p of such a 1x component at the job's speed. */
function goodScatter({ unit, runs }: JobInput): number {
  const frequencyHz = (runs[0]?.speedRpm ?? 0) / 60;
  if (unit === 'mm/s rms' || frequencyHz === 0) return GOOD_SCATTER_MM_S;
  const factor = sizeFactor('velocity', 'displacement', frequencyHz);
  return 2 * Math.SQRT2 * factor * GOOD_SCATTER_MM_S;
}
